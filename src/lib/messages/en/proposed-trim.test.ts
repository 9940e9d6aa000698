import { describe, expect, it } from 'vitest';
import { proposedTrimText } from './proposed-trim';

const trim = { index: 3, outermostCelsius: 20, restingCelsius: 2.5 };

describe('a proposed trim', () => {
	it.each([
		[
			'from',
			'celsius',
			/^Begins at 20\.0 °C and runs to 2\.5 °C, .* before the logger lay with the goods\.$/
		],
		['to', 'celsius', /^Leaves 2\.5 °C, .* ends at 20\.0 °C: perhaps after the logger was taken out\.$/],
		['from', 'fahrenheit', /^Begins at 68\.0 °F and runs to 36\.5 °F/]
	] as const)('says what the %s end looks like, in %s', (end, unit, words) => {
		expect(proposedTrimText({ ...trim, end }, unit)).toMatch(words);
	});
});
