import { flushSync, mount, unmount } from 'svelte';
import { afterEach, describe, expect, it } from 'vitest';
import Field from './Field.svelte';
import FileDrop from './FileDrop.svelte';
import Mark from './Mark.svelte';
import RadioGroup from './RadioGroup.svelte';

let shown: Record<string, unknown> | undefined;

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

describe('a field', () => {
	it('is named by its label and described by its error, which takes the place of the help', () => {
		shown = mount(Field, {
			target: document.body,
			props: {
				name: 'setPoint',
				label: 'Set-point',
				value: '34',
				unit: '°C',
				help: 'As on the unit',
				error: '34 is outside −30 to 30.'
			}
		});
		flushSync();
		const input = document.querySelector('input');
		expect(input?.name).toBe('setPoint');
		expect(document.querySelector('label')?.htmlFor).toBe(input?.id);
		expect(input?.getAttribute('aria-invalid')).toBe('true');
		const described = document.getElementById(input?.getAttribute('aria-describedby') ?? '');
		expect(described?.textContent).toContain('34 is outside −30 to 30.');
		expect(document.body.textContent).not.toContain('As on the unit');
	});
});

describe('a mark', () => {
	it('gives its meaning as text where the word is not shown', () => {
		shown = mount(Mark, {
			target: document.body,
			props: { kind: 'hold', word: 'On hold', isWordHidden: true }
		});
		expect(document.querySelector('.sr-only')?.textContent).toBe('On hold');
		expect(document.querySelector('svg')?.getAttribute('aria-hidden')).toBe('true');
	});
});

describe('a group of answers', () => {
	it('is one question with its answers, one of them chosen', () => {
		shown = mount(RadioGroup, {
			target: document.body,
			props: {
				name: 'order',
				legend: 'Is 03/04 the 3rd of April or the 4th of March?',
				options: [
					{ value: 'day', label: '3 April' },
					{ value: 'month', label: '4 March' }
				],
				value: 'day'
			}
		});
		flushSync();
		expect(document.querySelector('legend')?.textContent).toContain('Is 03/04');
		const chosen = document.querySelectorAll<HTMLInputElement>('input:checked');
		expect([...chosen].map((input) => input.value)).toEqual(['day']);
	});
});

describe('a place to drop files', () => {
	it('tells the page what was taken and what is too large', () => {
		const calls: [string[], string[]][] = [];
		shown = mount(FileDrop, {
			target: document.body,
			props: {
				name: 'read',
				label: 'Bring the export',
				maxBytes: 10,
				isMultiple: true,
				onfiles: (taken: File[], refused: { file: File; reason: string }[]) =>
					calls.push([
						taken.map((file) => file.name),
						refused.map(({ file, reason }) => `${file.name} ${reason}`)
					])
			}
		});
		const files = [new File(['a;b'], 'trip.csv'), new File(['x'.repeat(20)], 'large.csv')];
		const event = new Event('drop', { bubbles: true, cancelable: true });
		Object.defineProperty(event, 'dataTransfer', { value: { files } });
		document.querySelector('[role=group]')?.dispatchEvent(event);
		expect(calls).toEqual([[['trip.csv'], ['large.csv too-large']]]);
		expect(event.defaultPrevented).toBe(true);
	});
});
