import type { RangePart, RangeSource } from '../../domain/receiving/range-parts';
import { decimal } from '../../format';

const sources: Record<RangeSource, string> = {
	accuracy: 'the logger’s ± and the model’s',
	gaps: 'hours nobody watched',
	opening: 'the opening balance’s ±',
	'full-life': 'the ± on full life'
};

const shortSources: Record<RangeSource, string> = {
	accuracy: 'logger and model',
	gaps: 'gaps',
	opening: 'opening balance',
	'full-life': 'full life'
};

const hoursPerDay = 24;
/** What is less does not show among days to a tenth. */
const leastDays = 0.05;

/** "Includes the logger’s ± and the model’s (−0.3 +0.3 d) …": what the range is made of; parts of nothing are left out. */
export function rangeIncludes(parts: readonly RangePart[] | undefined, locale: string): string | null {
	if (!parts) return null;
	const days = (hours: number) =>
		hours / hoursPerDay < leastDays ? 'under 0.1' : decimal(hours / hoursPerDay, 1, locale);
	const said = parts
		.map(({ source, lowerHours, raiseHours }) => ({
			source,
			ways: [
				lowerHours > 0 ? signed('−', days(lowerHours)) : '',
				raiseHours > 0 ? signed('+', days(raiseHours)) : ''
			].filter(Boolean)
		}))
		.filter(({ ways }) => ways.length > 0)
		.map(({ source, ways }) => `${sources[source]} (${ways.join(' ')} d)`);
	return said.length === 0
		? 'Low and high are the figure itself: nothing is known to be off.'
		: `Low to high includes ${said.join(', ')}.`;
}

function signed(sign: string, days: string): string {
	return days.startsWith('under') ? `${sign} ${days}` : `${sign}${days}`;
}

/** The same beside a figure, where there is room for a line: "Low to high: logger and model, opening balance". */
export function rangeSourcesText(parts: readonly RangePart[] | undefined): string | null {
	if (!parts) return null;
	const told = parts.filter(({ lowerHours, raiseHours }) => lowerHours > 0 || raiseHours > 0);
	if (told.length === 0) return 'Low and high are the figure itself.';
	return `Low to high: ${told.map(({ source }) => shortSources[source]).join(', ')}.`;
}
