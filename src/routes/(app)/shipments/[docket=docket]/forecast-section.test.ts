import { flushSync, mount, unmount } from 'svelte';
import { afterEach, describe, expect, it } from 'vitest';
import ForecastSection from './ForecastSection.svelte';

const fromMs = Date.UTC(2026, 3, 3, 6);
const rates = {
	referenceCelsius: 0,
	model: { kind: 'constant-q10', q10: 3 },
	validFromCelsius: -5,
	validToCelsius: 25,
	chillingCelsius: null
} as const;
/** Ten days left at 0 °C, give or take one. */
const basis = {
	lineId: 'a',
	line: 1,
	lot: 'L-1',
	fromMs,
	remainingHours: { value: 240, low: 216, high: 264 },
	rates,
	neededAtCustomer: { hours: 120, celsius: 0 }
};
type Props = Parameters<typeof ForecastSection>[1];

let shown: Record<string, unknown> | undefined;

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

function show(props: Partial<Props> = {}): void {
	const given: Props = {
		bases: [basis],
		lineId: 'a',
		zone: 'UTC',
		unit: 'celsius',
		number: 8,
		includes: null
	};
	shown = mount(ForecastSection, { target: document.body, props: { ...given, ...props } });
	flushSync();
}

function type(name: string, text: string): void {
	const input = document.querySelector<HTMLInputElement>(`input[name="${name}"]`);
	if (!input) throw new Error(`There is no field ${name}.`);
	input.value = text;
	input.dispatchEvent(new Event('input', { bubbles: true }));
	flushSync();
}

const said = () =>
	[...document.querySelectorAll('[aria-live]')].map(
		(part) => part.textContent?.replace(/\s+/g, ' ').trim() ?? ''
	);
const rowOf = (first: string) =>
	[...document.querySelectorAll('tbody tr')]
		.map((row) => [...row.children].map((cell) => cell.textContent?.trim()))
		.find(([head]) => head === first);

describe('the forecast of a docket', () => {
	it('says how long life lasts at the reference, its range, and when it ends about', () => {
		show();
		expect(said()[0]).toMatch(/^10\.0 d left, 9\.0–11\.0; life ends about .*13 Apr/);
		expect(document.body.textContent).not.toMatch(/use by/i);
	});

	it('moves as a temperature is typed, without the server', () => {
		show();
		// Q10 of 3, by its definition: at 10 °C three times as fast, 80 h.
		type('forecast-degrees', '10');
		expect(said()[0]).toMatch(/^3\.3 d left, 3\.0–3\.7; life ends about .*6 Apr/);
		type('forecast-degrees', 'warm');
		expect(document.body.textContent).toContain('Enter a temperature, such as 4.');
		expect(said()[0]).toBe('');
	});

	it('widens by what is given or taken', () => {
		show();
		type('forecast-degrees', '10');
		type('forecast-span', '10');
		// From 0 to 20 °C: 216/9 h on the low, 264/1 h on the high.
		expect(said()[0]).toMatch(/^3\.3 d left, 1\.0–11\.0/);
	});

	it('takes a true minus and a comma, and says what lies outside the model', () => {
		show();
		type('forecast-degrees', '−7,5');
		// Held at −5 °C: 240 × 3^0.5 h.
		expect(said()[0]).toMatch(/^17\.3 d left/);
		expect(said()[0]).toContain('Outside the model');
	});

	it('has a table of common temperatures within the model, the reference among them', () => {
		show();
		expect(rowOf('0.0')).toEqual(['0.0', '10.0', '9.0–11.0', expect.stringContaining('13 Apr')]);
		// 240/3^0.5 h.
		expect(rowOf('5.0')?.[1]).toBe('5.8');
		expect(rowOf('−18.0')).toBeUndefined();
	});

	it.each([
		// A day at 10 °C uses three at the reference: 7.0 d left, 6.0 on the low, of 5 needed.
		['24', '10', /^Yes, even on the low There on .*4 Apr.* with 7\.0 d at 0 °C, 6\.0–8\.0; 5 d are needed\./],
		['44', '10', /^In doubt: the low falls short/],
		['60', '10', /^No, not even on the high/]
	])('tells whether enough is left after %s h at %s °C', (hours, degrees, answer) => {
		show();
		type('leg0-hours', hours);
		type('leg0-degrees', degrees);
		expect(said()[1]).toMatch(answer);
	});

	it('adds a leg as the last one is typed, and asks for a figure that is none', () => {
		show();
		type('leg0-hours', '12');
		expect(document.querySelector('input[name="leg1-hours"]')).not.toBeNull();
		type('leg0-degrees', '4');
		type('leg1-hours', 'soon');
		expect(said()[1]).toContain('One leg is no figure yet');
	});

	it('lets a line be chosen where there are several, and shows nothing without any', async () => {
		const other = {
			...basis,
			lineId: 'b',
			line: 2,
			lot: 'L-2',
			remainingHours: { value: 48, low: 48, high: 48 }
		};
		show({ bases: [basis, other], lineId: 'b', includes: 'Includes the logger.' });
		expect(said()[0]).toMatch(/^2\.0 d left/);
		expect(document.body.textContent).toContain('Includes the logger.');
		if (shown) await unmount(shown);
		shown = undefined;
		document.body.replaceChildren();
		show({ bases: [] });
		expect(document.body.textContent?.trim()).toBe('');
	});
});
