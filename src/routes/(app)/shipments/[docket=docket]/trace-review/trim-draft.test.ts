import { describe, expect, it } from 'vitest';
import { TrimDraft } from './trim-draft.svelte';

const draft = () =>
	new TrimDraft('Europe/Berlin', { fromText: '2026-03-30T08:10', toText: '2026-03-30T08:10' });
const stretch = { fromMs: Date.parse('2026-03-30T06:10:00Z'), toMs: Date.parse('2026-03-30T07:05:00Z') };

describe('a trim that is being thought of', () => {
	it('begins with the window’s first moment and leaves out nothing', () => {
		expect(draft()).toMatchObject({
			stretch: null,
			isExact: false,
			isOpen: false,
			toText: '2026-03-30T08:10'
		});
	});

	it('fills the fields when an end is moved, and opens the form', () => {
		const one = draft();
		one.move(stretch);
		expect(one).toMatchObject({
			fromText: '2026-03-30T08:10',
			toText: '2026-03-30T09:05',
			isExact: true,
			isOpen: true
		});
		one.move(null);
		expect(one).toMatchObject({ stretch: null, isExact: false, toText: '2026-03-30T08:10', isOpen: true });
	});

	it('follows the fields as soon as they say a stretch', () => {
		const one = draft();
		one.type('to', '2026-03-30T09:05');
		expect(one.stretch).toEqual(stretch);
		expect(one.isExact).toBe(false);
		for (const nonsense of ['2026-03-30T08:10', '2026-03-30T07:00', '', 'soon']) {
			one.type('to', nonsense);
			expect(one.stretch, nonsense).toBeNull();
		}
	});

	it('sends the instant the chart set, to the millisecond, until a field is typed in', () => {
		const one = draft();
		// In the night the clocks are put back 02:30 comes twice; this is the second.
		one.move({ fromMs: Date.parse('2026-10-25T01:30:00Z'), toMs: Date.parse('2026-10-25T05:00:00Z') });
		one.type('from', one.fromText);
		expect(one.isExact).toBe(true);
		expect(one.stretch?.fromMs).toBe(Date.parse('2026-10-25T01:30:00Z'));
		one.type('from', '2026-10-25T02:31');
		expect(one).toMatchObject({ isExact: false, stretch: null });
	});
});
