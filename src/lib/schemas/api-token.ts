import { z } from 'zod';
import { text } from './shipment-parts';

/** One of somebody's own tokens, as their settings show it. */
export interface ApiTokenView {
	id: string;
	/** What it is for, in its owner's words; empty where a command made it. */
	name: string;
	createdAt: string;
	lastUsedAt: string | null;
}

export const apiTokenForm = z.object({
	name: text(80, 'Say which program it is for.'),
	password: z.string({ error: 'Enter your password.' }).min(1, 'Enter your password.')
});
export type ApiTokenForm = z.output<typeof apiTokenForm>;

export const apiTokenEnding = z.object({ tokenId: z.uuid() });
