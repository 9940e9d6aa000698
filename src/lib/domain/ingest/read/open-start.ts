import type { ReadContext } from '../ingestion';
import { endsOf, startingAt, type OpenTimes, type TimeOption } from './open-times';

/**
 * Asks when running times began. Offered are a start at loading and an end at the arrival or the upload; `from` places
 * the rows for a start, `step` is what a shift has to be a multiple of (a day where the rows keep their own clock).
 */
export function openStart(
	why: string,
	context: ReadContext,
	rowsFrom: (startMs: number) => Float64Array,
	stepMs = 1,
	others: readonly TimeOption[] = []
): OpenTimes {
	const { journeyFromMs: from, journeyToMs: to, uploadedMs } = context;
	const options: TimeOption[] = [...others];
	const offer = (label: string, startMs: number): void => {
		const ms = rowsFrom(startMs);
		const { firstMs } = endsOf(ms);
		const isKnown = options.some((option) => option.ms !== null && endsOf(option.ms).firstMs === firstMs);
		if (!isKnown && Number.isFinite(firstMs)) options.push({ answer: { startMs: firstMs }, label, ms });
	};
	const endingBy = (endMs: number): number => {
		const { firstMs, lastMs } = endsOf(rowsFrom(endMs));
		return firstMs - Math.ceil((lastMs - endMs) / stepMs) * stepMs;
	};
	if (from !== null) offer('journey', from);
	if (to !== null && to <= uploadedMs) offer('arrival', endingBy(to));
	offer('upload', endingBy(uploadedMs));
	return { code: 'start', why, options: options.slice(0, 3) };
}

/** Asks which of two calendars a file's days are counted in, or whether its clock was ever set: by where it begins. */
export function openBeginning(
	why: string,
	ms: Float64Array,
	context: ReadContext,
	others: readonly TimeOption[]
): OpenTimes {
	const asWritten: TimeOption = { answer: { startMs: endsOf(ms).firstMs }, label: 'as-written', ms };
	return openStart(why, context, (startMs) => startingAt(ms, startMs), 1, [asWritten, ...others]);
}
