import { flushSync, mount, unmount } from 'svelte';
import { afterEach, describe, expect, it, vi } from 'vitest';
import OriginalLine from './OriginalLine.svelte';

let shown: Record<string, unknown> | undefined;

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

const answer = { line: 1233, text: '2026-04-02 09:20;10,4', isCut: false };

function show(onask: (atMs: number) => Promise<typeof answer>) {
	shown = mount(OriginalLine, { target: document.body, props: { atMs: 7, onask } });
	flushSync();
	return {
		link: document.querySelector('button'),
		text: () => document.body.textContent?.replace(/\s+/g, ' ').trim()
	};
}

describe('the original text of a reading', () => {
	it('is asked for only when it is wanted, and takes the keyboard along', async () => {
		const asked: number[] = [];
		const { link, text } = show(async (atMs) => {
			asked.push(atMs);
			return answer;
		});
		expect(asked).toEqual([]);
		link?.focus();
		link?.click();
		await vi.waitFor(() => expect(text()).toBe('line 1,233 2026-04-02 09:20;10,4'));
		expect(asked).toEqual([7]);
		await vi.waitFor(() => expect(document.activeElement).toBe(document.querySelector('p')));
	});

	it('is said to be cut where it is, and why there is none where there is none', async () => {
		const { link, text } = show(async () => ({ ...answer, isCut: true }));
		link?.click();
		await vi.waitFor(() => expect(text()).toContain('10,4 …'));
		if (shown) await unmount(shown);
		const none = show(async () => {
			throw new Error('This trace has no reading at that moment.');
		});
		none.link?.click();
		await vi.waitFor(() => expect(none.text()).toBe('This trace has no reading at that moment.'));
	});
});
