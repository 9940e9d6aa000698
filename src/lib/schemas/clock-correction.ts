import { z } from 'zod';
import { neededText } from './field';

const msPerSecond = 1000;
/** A year: a wrong date is a clock set wrong too. */
const longestMs = 366 * 24 * 3600 * msPerSecond;
const notAnAmount = 'Write hours and minutes, such as 2:00 or 0:25.';

/** Hours, minutes and, if need be, seconds, as `2:00` or `0:25:30`, in ms. */
const amount = z
	.string({ error: notAnAmount })
	.trim()
	.regex(/^\d{1,4}:[0-5]\d(:[0-5]\d)?$/, notAnAmount)
	.transform((text) => {
		const [hours = 0, minutes = 0, seconds = 0] = text.split(':').map(Number);
		return ((hours * 60 + minutes) * 60 + seconds) * msPerSecond;
	})
	.refine((ms) => ms > 0, 'That would change nothing.')
	.refine((ms) => ms <= longestMs, 'At most a year. Withdraw the read if it is of another trip.');

/** By how much, and which way, the clock of a logger was wrong. */
export const clockCorrectionForm = z
	.object({
		way: z.enum(['earlier', 'later'], 'Say which way.'),
		amount,
		reason: neededText(300, 'Say how you know that the clock was wrong.')
	})
	.transform(({ way, amount: ms, reason }) => ({ shiftMs: way === 'earlier' ? -ms : ms, reason }));
export type ClockCorrectionForm = z.output<typeof clockCorrectionForm>;

/** Takes a correction back. */
export const clockRestoring = z.object({ correctionId: z.uuid('Choose a correction.') });

/** A correction that stands, as pages and the report name it. */
export interface ClockCorrectionView {
	id: string;
	readId: string;
	/** Added to every reading's instant, ms. */
	shiftMs: number;
	reason: string;
	by: string;
	at: string;
}

/** The same shift as the form takes it: `2:00`, with seconds only where there are any. */
export function amountText(shiftMs: number): string {
	const seconds = Math.round(Math.abs(shiftMs) / msPerSecond);
	const two = (value: number) => String(value).padStart(2, '0');
	const whole = `${Math.floor(seconds / 3600)}:${two(Math.floor(seconds / 60) % 60)}`;
	return seconds % 60 === 0 ? whole : `${whole}:${two(seconds % 60)}`;
}
