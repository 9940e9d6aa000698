import type { PartQuantities } from '../domain/receiving/quantities';
import { z } from 'zod';
import type { Stage, Verdict } from './docket';
import { optionalDay, optionalFlag, optionalId, optionalText } from './shipment-parts';

/** What the board shows: a day, and which of its loads. A faulty part of an address counts as not given. */
export const boardQuery = z.object({
	day: optionalDay.catch(null),
	dock: optionalText(40).catch(null),
	product: optionalId.catch(null),
	carrier: optionalId.catch(null),
	mine: optionalFlag.catch(null),
	q: optionalText(100).catch(null)
});
export type BoardQuery = z.output<typeof boardQuery>;

/** What is to be done next with a load, and where. */
export interface NextAct {
	act: 'log-arrival' | 'upload' | 'answer' | 'review' | 'sign' | 'open';
	href: string;
	/** Questions that are open, for `answer`. */
	questions: number;
	/** Whether it is the reader's own to do. */
	isMine: boolean;
}

/** Life left on the line that has the least, by its governing trace. */
export interface BoardLife {
	hours: number;
	lowHours: number;
	highHours: number;
	neededHours: number;
	fullHours: number;
}

export interface BoardRow {
	id: string;
	number: string;
	/** Counts up with every change of the docket. */
	version: number;
	stage: Stage;
	verdict: Verdict | null;
	dueAt: string | null;
	arrivedAt: string | null;
	supplier: string;
	goods: { product: string; lots: number; cases: number; unit: string };
	carrier: string | null;
	vehicle: string | null;
	dock: string | null;
	reads: { due: number; kept: number; questions: number };
	/** The gravest thing the reads say. */
	finding:
		| { kind: 'excursion'; ordinal: number; severity: string; extremeCelsius: number }
		| { kind: 'short'; lowHours: number; neededHours: number }
		| { kind: 'question'; fileName: string }
		| null;
	life: BoardLife | null;
	rejectBy: { startsAt: string; deadlineAt: string } | null;
	decided: { by: string; at: string } | null;
	/** What came in and what was refused, of a load taken in part. */
	part: PartQuantities | null;
	next: NextAct;
}

export interface BoardDay {
	on: string;
	loads: number;
	done: number;
	isShown: boolean;
}

/** The day's loads of a site. Nothing in it depends on the moment it is asked for, so that it can be compared. */
export interface BoardView {
	dayOn: string;
	isToday: boolean;
	holiday: string | null;
	/** When the docks open and close that day; null where they stay shut. */
	opensAt: string | null;
	closesAt: string | null;
	docks: string[];
	rows: BoardRow[];
	/** Loads of the day by stage, before filters. */
	counts: Record<Stage, number> & { mine: number; all: number };
	products: { id: string; name: string }[];
	carriers: { id: string; name: string }[];
	days: BoardDay[];
}
