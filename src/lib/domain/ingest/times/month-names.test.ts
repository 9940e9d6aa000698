import { describe, expect, it } from 'vitest';
import { isWeekday, monthOfName } from './month-names';

// Source: Unicode CLDR as the engine's Intl carries it. Left out: Croatian, whose names are other months in Polish.
const languages = [
	...['en', 'de', 'fr', 'es', 'pt', 'it', 'nl', 'pl', 'tr', 'cs', 'sv', 'da', 'nb'],
	...['fi', 'hu', 'ro', 'et', 'ru', 'uk', 'el', 'sk', 'id']
];

function monthIn(language: string, month: number, width: 'long' | 'short'): string {
	const parts = new Intl.DateTimeFormat(language, {
		day: 'numeric',
		month: width,
		year: 'numeric',
		timeZone: 'UTC'
	}).formatToParts(Date.UTC(2026, month - 1, 14));
	return parts.find(({ type }) => type === 'month')?.value ?? '';
}

describe('the name of a month', () => {
	it.each(languages)('is known in %s, in full and short', (language) => {
		for (let month = 1; month <= 12; month++) {
			const names = [monthIn(language, month, 'long'), monthIn(language, month, 'short')];
			expect(names.filter((name) => /\p{L}/u.test(name)).map((name) => [name, monthOfName(name)])).toEqual(
				names.filter((name) => /\p{L}/u.test(name)).map((name) => [name, month])
			);
		}
	});

	it('is no weekday and no other word', () => {
		expect(['Monday', 'szerda', 'Temperature', 'ok', ''].map(monthOfName)).toEqual([0, 0, 0, 0, 0]);
		expect([isWeekday('Mittwoch'), isWeekday('Temperature')]).toEqual([true, false]);
	});
});
