import { SvelteSet } from 'svelte/reactivity';

interface Rows {
	readonly rows: readonly { readonly id: string }[];
}

const askEveryMs = 15_000;
const washMs = 4_000;

/**
 * A board as it goes on after the first paint: asked for again every quarter of a minute, answered by a tag alone
 * while nothing changed; rows that did are named for as long as their wash lasts.
 */
export function followRows<View extends Rows>(
	first: () => View,
	address: () => string,
	startMs: () => number
) {
	let later = $state.raw<{ of: View; view: View }>();
	let ticked = $state<number>();
	const changed = new SvelteSet<string>();
	const view = $derived(later?.of === first() ? later.view : first());

	function take(next: View) {
		const before = Object.fromEntries(view.rows.map((row) => [row.id, JSON.stringify(row)]));
		for (const row of next.rows) if (before[row.id] !== JSON.stringify(row)) changed.add(row.id);
		later = { of: first(), view: next };
		setTimeout(() => changed.clear(), washMs);
	}

	// Reaches outside: the clock, and the server while somebody looks.
	$effect(() => {
		let tag: string | null = null;
		const from = address();
		async function ask() {
			ticked = Date.now();
			if (document.hidden) return;
			const headers: Record<string, string> = tag ? { 'If-None-Match': tag } : {};
			const answer = await fetch(from, { headers, cache: 'no-store' }).catch(() => null);
			// No network: the board stays as it was, and asks again.
			if (!answer?.ok) return;
			tag = answer.headers.get('etag');
			take(await answer.json());
		}
		ticked = Date.now();
		const timer = setInterval(ask, askEveryMs);
		return () => clearInterval(timer);
	});

	return {
		get view() {
			return view;
		},
		get nowMs() {
			return ticked ?? startMs();
		},
		changed
	};
}
