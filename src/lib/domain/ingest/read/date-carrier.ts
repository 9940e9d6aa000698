import { msPerDay } from '../times/calendar';
import { noOffset, noTime, type Stamp } from '../times/stamp';

/** Remembers the last written date for rows that leave it blank, and counts the midnights passed since. */
export interface DateCarrier {
	keep(stamp: Stamp): void;
	/** Forgets it: a row in between had a date that could not be read. */
	lose(): void;
	/** Takes note of the clock of the row before. */
	see(msOfDay: number): void;
	/** Gives a row without a date the last one; false where none has been written yet. */
	carryTo(stamp: Stamp, msOfDay: number): boolean;
}

const halfDay = msPerDay / 2;

/** A carrier for one pass over the rows, from the top of the file to its end. */
export function dateCarrier(): DateCarrier {
	let last: Pick<Stamp, 'shape' | 'a' | 'b' | 'c'> | null = null;
	let lastMs = 0;
	let days = 0;
	let rises = 0;
	return {
		keep({ shape, a, b, c, msOfDay }) {
			last = { shape, a, b, c };
			lastMs = msOfDay;
			days = 0;
		},
		lose() {
			last = null;
		},
		see(msOfDay) {
			if (msOfDay !== noTime) lastMs = msOfDay - Math.floor(msOfDay / msPerDay) * msPerDay;
		},
		carryTo(stamp, msOfDay) {
			if (last === null) return false;
			const step = msOfDay - lastMs;
			// Midnight lies where the clock turns round against the way in which the rows run.
			if (step < -halfDay && rises >= 0) days++;
			else if (step > halfDay && rises < 0) days--;
			else rises += Math.sign(step);
			lastMs = msOfDay;
			Object.assign(stamp, last, {
				msOfDay: msOfDay + days * msPerDay,
				offsetMinutes: noOffset,
				zoneWord: null
			});
			return true;
		}
	};
}
