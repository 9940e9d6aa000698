import { describe, expect, it } from 'vitest';
import { isWeekday, monthOfName, monthsMeant } from './month-names';

// Source: Unicode CLDR as the engine's Intl carries it.
const languages = [
	...['en', 'de', 'fr', 'es', 'pt', 'it', 'nl', 'pl', 'tr', 'cs', 'sv', 'da', 'nb'],
	...['fi', 'hu', 'ro', 'et', 'ru', 'uk', 'el', 'sk', 'id', 'sl', 'bg', 'lv', 'he', 'ar', 'hr']
];

/** The month that a name is in a language, where in another it is the one beside it. */
function known(language: string, name: string): number {
	const month = monthOfName(name);
	return monthsMeant(month)?.[language === 'hr' ? 1 : 0] ?? month;
}

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
			expect(
				names.filter((name) => /\p{L}/u.test(name)).map((name) => [name, known(language, name)])
			).toEqual(names.filter((name) => /\p{L}/u.test(name)).map((name) => [name, month]));
		}
	});

	it('that is another month in another language is left open, unless its ending tells', () => {
		// Source: CLDR: lipanj is June in Croatian, lipiec July in Polish; srpanj July, srpen August in Czech.
		expect(['lip', 'lis', 'srp', 'listopada'].map((name) => monthsMeant(monthOfName(name)))).toEqual([
			[7, 6],
			[11, 10],
			[8, 7],
			[11, 10]
		]);
		expect(['lipanj', 'lipca', 'srpnja', 'srpna', 'svibnja'].map(monthOfName)).toEqual([6, 7, 7, 8, 5]);
	});

	it('is no weekday and no other word', () => {
		expect(['Monday', 'szerda', 'Temperature', 'ok', ''].map(monthOfName)).toEqual([0, 0, 0, 0, 0]);
		expect([isWeekday('Mittwoch'), isWeekday('Temperature')]).toEqual([true, false]);
	});
});
