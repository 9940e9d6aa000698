import { flushSync, mount, unmount } from 'svelte';
import { afterEach, describe, expect, it } from 'vitest';
import { settableFindings } from '../../domain/receiving/settable-findings';
import { findingNames } from '../../messages/en/finding-names';
import GradeFields from './GradeFields.svelte';

let shown: Record<string, unknown> | undefined;

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

function show(props: Partial<Parameters<typeof GradeFields>[1]> = {}) {
	shown = mount(GradeFields, { target: document.body, props: { stored: {}, answer: null, ...props } });
	flushSync();
}

function choiceOf(code: string): HTMLSelectElement {
	const found = document.querySelector<HTMLSelectElement>(`select[name="grades.${code}"]`);
	if (!found) throw new Error(`There is no choice for ${code}.`);
	return found;
}

const textsOf = (code: string) => [...choiceOf(code).options].map(({ text }) => text);

describe('the grades of findings', () => {
	it('are one choice for each finding that may be graded, named by what it is about', () => {
		show();
		const labels = [...document.querySelectorAll('label')].map((label) => label.textContent?.trim());
		expect(labels).toEqual(settableFindings.map(({ code }) => findingNames[code]));
		expect(document.querySelectorAll('select')).toHaveLength(settableFindings.length);
		for (const { code } of settableFindings) expect(choiceOf(code).value).toBe('');
	});

	it('say what an empty choice leaves, and offer inform, note and hold, never reject', () => {
		show();
		expect(textsOf('calibration-overdue')[0]).toBe('as usual: note');
		expect(textsOf('seal-broken')[0]).toBe('as usual: hold');
		expect(textsOf('excursion')[0]).toBe('as usual: by how far');
		expect([...choiceOf('excursion').options].map(({ value }) => value)).toEqual([
			'',
			'inform',
			'note',
			'hold'
		]);
	});

	it('stand on what is kept, and after a refusal on what was chosen', () => {
		show({ stored: { 'seal-broken': 'note' } });
		expect(choiceOf('seal-broken').value).toBe('note');
		expect(choiceOf('cases-differ').value).toBe('');
	});

	it('keep what was chosen beside its fault', () => {
		const values = { grades: { 'cases-differ': 'hold' } };
		show({
			stored: { 'seal-broken': 'note' },
			answer: { values, issues: { 'grades.cases-differ': 'Choose another.' } }
		});
		expect(choiceOf('cases-differ').value).toBe('hold');
		expect(choiceOf('seal-broken').value).toBe('');
		expect(choiceOf('cases-differ').getAttribute('aria-invalid')).toBe('true');
		expect(document.body.textContent).toContain('Choose another.');
	});
});
