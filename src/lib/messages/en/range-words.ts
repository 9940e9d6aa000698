import type { RangePart, RangeSource } from '../../domain/receiving/range-parts';
import { decimal } from '../../format';

const sources: Record<RangeSource, string> = {
	accuracy: 'the logger’s ± and the model’s',
	gaps: 'hours nobody watched',
	opening: 'the opening balance’s ±',
	'full-life': 'the ± on full life'
};

const hoursPerDay = 24;

/** "Includes the logger’s ± and the model’s (−0.3 +0.3 d) …": what the range is made of; parts of nothing are left out. */
export function rangeIncludes(parts: readonly RangePart[] | undefined, locale: string): string | null {
	if (!parts) return null;
	const days = (hours: number) => decimal(hours / hoursPerDay, 1, locale);
	const said = parts
		.map(({ source, lowerHours, raiseHours }) => ({
			source,
			ways: [
				lowerHours > 0 ? `−${days(lowerHours)}` : '',
				raiseHours > 0 ? `+${days(raiseHours)}` : ''
			].filter(Boolean)
		}))
		.filter(({ ways }) => ways.length > 0)
		.map(({ source, ways }) => `${sources[source]} (${ways.join(' ')} d)`);
	return said.length === 0
		? 'Low and high are the figure itself: nothing is known to be off.'
		: `Low to high includes ${said.join(', ')}.`;
}
