import { flushSync, mount, unmount } from 'svelte';
import { afterEach, describe, expect, it, vi } from 'vitest';
import LayoutRow from '../../../settings/layouts/LayoutRow.svelte';
import OriginalLine from '$lib/components/chart/OriginalLine.svelte';
import type { LayoutView } from '$lib/schemas/layout';
import type { ReadView } from '$lib/schemas/read';
import RememberedPart from './[read=uuid]/RememberedPart.svelte';
import UploadRow from './UploadRow.svelte';
import type { UploadItem } from './upload-queue.svelte';

// In a browser a form's method reads in lower case, as the HTML standard has it; here it reads as it was written.
Object.defineProperty(HTMLFormElement.prototype, 'method', {
	get(this: HTMLFormElement) {
		return (this.getAttribute('method') ?? 'get').toLowerCase();
	}
});

let shown: Record<string, unknown> | undefined;
const text = () => document.body.textContent?.replace(/\s+/g, ' ') ?? '';
const button = (name: RegExp) =>
	[...document.querySelectorAll('button')].find((one) => name.test(one.textContent ?? ''));

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

function row(overrides: Partial<UploadItem>) {
	const acts: string[] = [];
	const item: UploadItem = {
		id: 'a',
		file: new File(['abc'], 'trip.csv'),
		step: 'queued',
		fraction: 0,
		glance: null,
		read: null,
		trouble: '',
		...overrides
	};
	const onstop = () => void acts.push('stop');
	const onretry = () => void acts.push('retry');
	const eyes = { zone: 'UTC', unit: 'celsius' } as const;
	shown = mount(UploadRow, {
		target: document.body,
		props: { item, docket: 'PS-26-1', eyes, onstop, onretry }
	});
	flushSync();
	return acts;
}

describe('a file of an upload', () => {
	it('names itself on each of its buttons', () => {
		const acts = row({ step: 'no-network', trouble: 'The network broke off. Nothing is lost.' });
		expect(
			button(/Send again/)
				?.textContent?.replace(/\s+/g, ' ')
				.trim()
		).toBe('Send again, trip.csv');
		button(/Send again/)?.click();
		expect(acts).toEqual(['retry']);
		expect(text()).toContain('Waits for the network');
		expect(text()).toContain('Nothing is lost.');
	});

	it('can be stopped until it has arrived', () => {
		const acts = row({ step: 'sending', fraction: 0.5 });
		button(/Stop/)?.click();
		expect(acts).toEqual(['stop']);
		expect(document.querySelector('[role=progressbar]')?.getAttribute('aria-valuenow')).toBe('50');
	});

	it.each([
		['question', 'Answer'],
		['understood', 'Look and keep'],
		['refused', 'Open']
	])('leads on from %s', (state, act) => {
		row({ step: 'sent', read: { id: 'r1', state } as UploadItem['read'] });
		const link = document.querySelector('a');
		expect(link?.getAttribute('href')).toBe('/shipments/PS-26-1/reads/r1');
		expect(link?.textContent?.replace(/\s+/g, ' ').trim()).toBe(`${act}, trip.csv`);
		expect(button(/Stop|Send/)).toBeUndefined();
	});
});

const layout: LayoutView = {
	id: '01970000-0000-7000-8000-000000000001',
	version: 2,
	answers: { dateOrder: 'dmy' },
	fingerprint: 'ab'.repeat(32),
	partnerName: 'Lowfen Leaf',
	sourceName: 'trip.csv',
	confirmedBy: 'R. Calloway',
	confirmedAt: '2026-03-03T10:00:00Z',
	timesUsed: 4,
	lastUsedAt: '2026-04-03T10:00:00Z',
	forgotten: null
};

function remembered(more: Partial<ReadView>, rights: { mayConfirm: boolean; mayAskAgain: boolean }) {
	const read = {
		zone: 'UTC',
		supplierName: 'Lowfen Leaf',
		remembered: null,
		ingestion: { kind: 'ok', context: { answers: { dateOrder: 'dmy' } } },
		...more
	} as unknown as ReadView;
	shown = mount(RememberedPart, { target: document.body, props: { read, issues: {}, ...rights } });
	flushSync();
}

describe('what was answered about a file', () => {
	it('is remembered by a tick that nobody has set beforehand', () => {
		remembered({}, { mayConfirm: true, mayAskAgain: true });
		const tick = document.querySelector<HTMLInputElement>('input[name=confirmed]');
		expect(tick?.checked).toBe(false);
		expect(text()).toContain('Read files of this layout so from now on: day first');
		expect(text()).toContain('From Lowfen Leaf');
		expect(button(/Ask about this file again/)).toBeDefined();
	});

	it('is not the dock’s to have remembered', () => {
		remembered({}, { mayConfirm: false, mayAskAgain: true });
		expect(document.querySelector('input')).toBeNull();
		expect(text()).toContain('QA or the quality manager can have it remembered');
	});

	it('is not offered to be remembered where it holds for this file alone', () => {
		const ingestion = { kind: 'ok', context: { answers: { startMs: 0 } } } as ReadView['ingestion'];
		remembered({ ingestion }, { mayConfirm: true, mayAskAgain: false });
		expect(document.querySelector('input, button')).toBeNull();
	});

	it('says that a file was read as last time, since when, and by whose word', () => {
		remembered({ remembered: { ...layout, isFromHere: false } }, { mayConfirm: true, mayAskAgain: true });
		expect(text()).toContain('Read as last time: day first, since Tue 3 Mar 2026.');
		expect(text()).toContain('R. Calloway confirmed it for files of this layout from Lowfen Leaf.');
		expect(document.querySelector('input[name=confirmed]')).toBeNull();
	});
});

describe('a remembered layout in the list', () => {
	it('says what, whose, by whom and how often, and asks for a reason to forget it', () => {
		const target = document.createElement('tbody');
		document.body.append(target);
		shown = mount(LayoutRow, { target, props: { layout, zone: 'UTC', mayForget: true } });
		flushSync();
		for (const said of ['Day first', 'Lowfen Leaf', 'R. Calloway', 'Tue 3 Mar 2026', '4', 'version 2'])
			expect(text()).toContain(said);
		expect(document.querySelector<HTMLTextAreaElement>('textarea[name=reason]')?.required).toBe(true);
	});

	it('offers nothing to whoever may not, nor for one that is forgotten', async () => {
		const target = document.createElement('tbody');
		document.body.append(target);
		shown = mount(LayoutRow, { target, props: { layout, zone: 'UTC', mayForget: false } });
		flushSync();
		expect(document.querySelector('form')).toBeNull();
		await unmount(shown);
		const forgotten = { at: '2026-04-01T00:00:00Z', by: 'R. Calloway', reason: 'new program' };
		shown = mount(LayoutRow, {
			target,
			props: { layout: { ...layout, forgotten }, zone: 'UTC', mayForget: true }
		});
		flushSync();
		expect(document.querySelector('form')).toBeNull();
		expect(text()).toContain('forgotten Wed 1 Apr 2026 by R. Calloway: new program');
	});
});

describe('the line of a reading', () => {
	it('is shown when asked for, as text', async () => {
		const asked: number[] = [];
		const onask = (atMs: number) => {
			asked.push(atMs);
			return Promise.resolve({ line: 1812, text: '03/04;<b>1,4</b>', isCut: false });
		};
		shown = mount(OriginalLine, { target: document.body, props: { atMs: 5, onask } });
		flushSync();
		button(/Show it in the file/)?.click();
		await Promise.resolve();
		await Promise.resolve();
		flushSync();
		expect(asked).toEqual([5]);
		expect(text()).toContain('line 1,812');
		expect(document.querySelector('bdi')?.textContent).toBe('03/04;<b>1,4</b>');
	});

	it('says why there is none', async () => {
		const onask = () => Promise.reject(new Error('This trace has no reading at that moment.'));
		shown = mount(OriginalLine, { target: document.body, props: { atMs: 5, onask } });
		flushSync();
		button(/Show it/)?.click();
		await vi.waitFor(() => {
			flushSync();
			expect(text()).toContain('no reading at that moment');
		});
	});
});
