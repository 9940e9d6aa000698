import { flushSync, mount, unmount } from 'svelte';
import { afterEach, describe, expect, it } from 'vitest';
import TryPage from './+page.svelte';
import type { PageProps } from './$types';

type Data = PageProps['data'];
type Differing = Data['trial']['differing'][number];

const judgement = {
	recommended: 'accept',
	remainingHours: { value: 250.3, low: 239.2, high: 261 },
	neededHours: 240,
	fullLifeHours: 432
} as const;
const line: Differing = {
	docket: 'PS-0042',
	arrivedAt: '2026-04-03T03:30:00.000Z',
	zone: 'UTC',
	line: 2,
	lot: 'L-7',
	specNumber: 1,
	isSigned: true,
	then: { ...judgement, recommended: 'hold' },
	now: { ...judgement, neededHours: 200 }
};

let shown: Record<string, unknown> | undefined;

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

function show(trial: Partial<Data['trial']>): void {
	const data = {
		name: 'Blueberries',
		isDraft: true,
		back: { href: '/specs/p', word: 'Spec', title: 'Blueberries' },
		trial: { number: 3, tried: 212, isCapped: false, untold: 0, differing: [], ...trial }
	};
	shown = mount(TryPage, { target: document.body, props: { data } as unknown as PageProps });
	flushSync();
}

const text = () => document.body.textContent?.replace(/\s+/g, ' ') ?? '';

describe('a version tried against past loads', () => {
	it('says first how many would have been decided otherwise', () => {
		show({ differing: [line] });
		expect(document.querySelector('h1')?.textContent?.trim()).toBe(
			'1 of 212 would have been decided otherwise'
		);
		expect(text()).toContain('draft v3');
	});

	it('shows each with its life, range and need as it was and as it would be', () => {
		show({ differing: [line] });
		const cells = [...document.querySelectorAll('tbody td')].map((cell) =>
			cell.textContent?.replace(/\s+/g, ' ')
		);
		expect(cells.at(-2)).toMatch(/Hold.*10\.4 d left, 10\.0–10\.9.*needed 10\.0 d.*by v1/);
		expect(cells.at(-1)).toMatch(/Accept.*10\.4 d left.*needed 8\.3 d/);
		expect(document.querySelector('tbody a')?.getAttribute('href')).toBe('/shipments/PS-0042');
		expect(text()).toContain('line 2, lot L-7, signed');
	});

	it('says where no trace told of life', () => {
		show({ differing: [{ ...line, then: { ...line.then, remainingHours: null } }] });
		expect(text()).toContain('life not known');
	});

	it('says what was left out: older loads, and those that cannot be judged again', () => {
		show({ tried: 298, untold: 2, isCapped: true });
		expect(text()).toContain('The newest 300 are shown; there are more.');
		expect(text()).toContain('2 lines could not be judged again');
		expect(text()).toContain('Every past line would have had the same recommendation.');
	});

	it('says what to wait for where there is nothing to try it on', () => {
		show({ tried: 0 });
		expect(document.querySelector('h1')?.textContent?.trim()).toBe('Nothing to try it on yet');
		expect(text()).toContain('As soon as a load of this product has arrived');
		expect(document.querySelector('table')).toBeNull();
	});
});
