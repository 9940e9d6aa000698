import { flushSync, mount, unmount, type Component } from 'svelte';
import { afterEach, describe, expect, it } from 'vitest';
import type { Spec } from '../../domain/shelf-life/spec';
import { specFormValues } from '../../schemas/spec-form-values';
import ModelForm from './ModelForm.svelte';
import NeedForm from './NeedForm.svelte';
import { SpecEditor, specEditorKey } from './spec-editor.svelte';

/** UC Davis Postharvest Center, produce fact sheet, broccoli: 28 d at most at 0 °C, 14 at 5 °C, 5 at 10 °C. */
const broccoli: Spec = {
	referenceCelsius: 0,
	fullLifeHours: 672,
	fullLifeUncertaintyHours: 0,
	model: {
		kind: 'life-table',
		points: [
			{ celsius: 0, lifeHours: 672 },
			{ celsius: 5, lifeHours: 336 },
			{ celsius: 10, lifeHours: 120 }
		]
	},
	validFromCelsius: 0,
	validToCelsius: 10,
	chillingCelsius: null,
	freezingCelsius: null,
	ceilingCelsius: null,
	upper: null,
	lower: null,
	neededHours: 240,
	openingDefaultHours: 96,
	mkt: { activationEnergyKilojoulesPerMole: null, windowHours: null, limitCelsius: null },
	sources: [],
	caution: null
};

let shown: Record<string, unknown> | undefined;

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

function show(part: Component, spec: Spec | null = broccoli): SpecEditor {
	const editor = new SpecEditor({
		values: spec ? specFormValues(spec, 'celsius') : { unit: 'celsius' },
		issues: {},
		saved: spec,
		isEditable: true,
		unit: 'celsius'
	});
	shown = mount(part, { target: document.body, context: new Map([[specEditorKey, editor]]) });
	flushSync();
	return editor;
}

function type(selector: string, text: string): void {
	const input = document.querySelector<HTMLInputElement | HTMLTextAreaElement>(selector);
	if (!input) throw new Error(`nothing to type into at ${selector}`);
	input.value = text;
	input.dispatchEvent(new Event('input', { bubbles: true }));
	flushSync();
}

const button = (name: string) =>
	[...document.querySelectorAll('button')].find((one) =>
		(one.getAttribute('aria-label') ?? one.textContent).includes(name)
	);
const words = () => document.body.textContent.replace(/\s+/g, ' ');

describe('the model’s form', () => {
	it('follows what is typed at once, and keeps the last curve that made sense', () => {
		const editor = show(ModelForm);
		type('[name=point0Life]', '12');
		expect(editor.spec?.model).toMatchObject({ points: [{}, { celsius: 5, lifeHours: 288 }, {}] });
		type('[name=point0Life]', '40');
		expect(editor.spec?.model).toMatchObject({ points: [{}, { celsius: 5, lifeHours: 288 }, {}] });
		expect(words()).toContain('Point 1: 40 days is more than at the colder temperature before it.');
	});

	it('offers one more row than are filled, and takes a row out', () => {
		const editor = show(ModelForm);
		for (let at = 2; at < 30; at++) {
			type(`[name=point${at}Degrees]`, String(10 + at));
			type(`[name=point${at}Life]`, (4 - at / 10).toFixed(1));
		}
		expect(document.querySelector('[name=point30Degrees]')).not.toBeNull();
		expect(editor.spec?.model).toMatchObject({
			points: expect.toSatisfy((points: unknown[]) => points.length === 31)
		});
		button('Take point 1 out')?.click();
		flushSync();
		expect(editor.values.point0Degrees).toBe('10');
		expect(editor.spec?.model).toMatchObject({
			points: expect.toSatisfy((points: unknown[]) => points.length === 30)
		});
	});
});

describe('the fit', () => {
	it('shows the best of each kind for a pasted table with its residuals, and the chosen one fills the form', () => {
		const editor = show(ModelForm, null);
		type('textarea', 'T;life\n0;28\n5;14\n10;5');
		// Two lives: Q10 = 28/5 = 5.6; at 5 °C it says 28 / 5.6^0.5 = 11.83 d, 15 % less than 14.
		expect(words()).toContain('Q10 5.60');
		expect(words()).toMatch(/5\.0\s*14\.0.*11\.8 −15 %/);
		const rows = [...document.querySelectorAll('tr')].filter((row) =>
			row.textContent.includes('Two storage')
		);
		rows
			.find((row) => row.querySelector('button'))
			?.querySelector('button')
			?.click();
		flushSync();
		expect(editor.values).toMatchObject({
			model: 'two-lives',
			reference: '0',
			fullLife: '28',
			otherDegrees: '10',
			otherLife: '5',
			validTo: '10'
		});
	});

	it('says in words which line it could not read, and which kind does not fit', () => {
		show(ModelForm, null);
		type('textarea', '0 5\n5 x\n10 14');
		expect(words()).toContain('Line 2, “5 x”, is not a temperature and a life.');
		expect(words()).toContain('these lives are longer when warmer');
		expect(button('Use it')).toBeUndefined();
	});

	it('of a later table leaves no row of an earlier one behind', () => {
		const editor = show(ModelForm);
		type('textarea', '0 28\n10 5');
		const row = [...document.querySelectorAll('tr')].find((one) => one.textContent.includes('Storage-life'));
		row?.querySelector('button')?.click();
		flushSync();
		expect(editor.spec?.model).toEqual({
			kind: 'life-table',
			points: [
				{ celsius: 0, lifeHours: 672 },
				{ celsius: 10, lifeHours: 120 }
			]
		});
	});
});

describe('the needs', () => {
	it('are said at their own temperature, with what they are worth at the reference', () => {
		show(NeedForm);
		type('[name=needed]', '7');
		type('[name=neededDegrees]', '5');
		// At 5 °C life runs 28/14 = 2 times as fast: 7 d there are 14 d at 0 °C.
		expect(words()).toContain('worth 14.0 at the reference');
	});

	it('at the customer have days and a temperature, or neither', () => {
		const editor = show(NeedForm);
		type('[name=customerNeeded]', '4');
		expect(words()).toContain('Life needed at the customer, temperature: nothing is entered.');
		type('[name=customerDegrees]', '5');
		expect(editor.spec?.neededAtCustomer).toEqual({ hours: 96, celsius: 5 });
	});
});
