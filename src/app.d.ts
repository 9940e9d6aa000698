import type { Context } from '$lib/server/context';

declare global {
	namespace App {
		interface Error {
			message: string;
			code?: string;
			errorId?: string;
		}
		interface PageData {
			/** Where a phone's way back leads, and what the page is. */
			back?: { href: string; word: string; title?: string };
		}
		interface Locals {
			/** Who is asking; null without a session. */
			context: Context | null;
			requestId: string;
		}
	}
}

export {};
