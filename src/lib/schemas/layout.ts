import { z } from 'zod';
import type { Answers } from '../domain/ingest/ingestion';
import { neededText } from './field';
import { choice, listQuery } from './list';

export const layoutScopes = ['partner', 'logger-type'] as const;
/** Whose files of the layout an answer holds for: one sender's, or those of this type of logger from anybody. */
export type LayoutScope = (typeof layoutScopes)[number];

/** The tick is the confirmation: without it nothing is remembered. */
export const rememberForm = z.object({
	confirmed: z.literal('on', 'Tick the box to have this answer remembered.'),
	scope: z.enum(layoutScopes, 'Choose whose files it holds for.')
});

export const forgetForm = z.object({
	layoutId: z.uuid('Choose a remembered layout from the list.'),
	reason: neededText(300, 'Say why it is to be forgotten.')
});

export const layoutStates = ['in-use', 'forgotten', 'any'] as const;
export const layoutQuery = listQuery(['confirmed']).extend({ state: choice(layoutStates) });
export type LayoutQuery = z.output<typeof layoutQuery>;

/** A remembered answer, in the list and on a file that was read by it. */
export interface LayoutView {
	id: string;
	version: number;
	answers: Answers;
	fingerprint: string;
	/** Whose files; null: those of this layout from anybody. */
	partnerName: string | null;
	/** The file it was confirmed on. */
	sourceName: string | null;
	confirmedBy: string;
	confirmedAt: string;
	/** Files read by it since. */
	timesUsed: number;
	lastUsedAt: string | null;
	forgotten: { at: string; by: string; reason: string } | null;
}
