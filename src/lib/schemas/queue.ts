import { z } from 'zod';
import type { BoardRow } from './board';
import { choice } from './list';
import { optionalId, optionalText } from './shipment-parts';

export const queueSorts = ['clock', 'arrived', 'life'] as const;
export const queueTakers = ['any', 'me', 'nobody'] as const;
export const queueReadiness = ['ready', 'all'] as const;

/** Which of the waiting dockets, and in what order. A faulty part of an address counts as not given. */
export const queueQuery = z.object({
	sort: choice(queueSorts),
	taken: choice(queueTakers),
	show: choice(queueReadiness),
	product: optionalId.catch(null),
	supplier: optionalId.catch(null),
	q: optionalText(100).catch(null)
});
export type QueueQuery = z.output<typeof queueQuery>;

/** The clock of a docket that runs out first: to refuse, to give notice, until the low falls under the need, or of a hold. */
export interface QueueClock {
	kind: 'reject' | 'notice' | 'life' | 'hold';
	startsAt: string;
	deadlineAt: string;
	basis: string;
}

export interface QueueRow extends BoardRow {
	takenBy: { id: string; name: string } | null;
	clock: QueueClock | null;
}

/** What waits for QA at a site. Nothing in it depends on the moment it is asked for, so that it can be compared. */
export interface QueueView {
	rows: QueueRow[];
	counts: { ready: number; all: number; mine: number; nobody: number };
	products: { id: string; name: string }[];
	suppliers: { id: string; name: string }[];
}

/** To take a docket on, or to hand it back. */
export const takeInput = z.object({ number: z.string().trim().min(1).max(40) });
