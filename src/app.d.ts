import type { Context } from '$lib/server/context';

declare global {
	namespace App {
		interface Error {
			message: string;
			code?: string;
			errorId?: string;
		}
		interface Locals {
			/** Who is asking; null without a session. */
			context: Context | null;
			requestId: string;
		}
	}
}

export {};
