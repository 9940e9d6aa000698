import { SvelteSet } from 'svelte/reactivity';
import type { BoardView } from '$lib/schemas/board';

const askEveryMs = 15_000;
const washMs = 4_000;

/**
 * The board as it goes on after the first paint: asked for again every quarter of a minute, answered by a tag alone
 * while nothing changed; rows that did are named for as long as their wash lasts.
 */
export function followBoard(first: () => BoardView, search: () => string, startMs: () => number) {
	let later = $state.raw<{ of: BoardView; board: BoardView }>();
	let ticked = $state<number>();
	const changed = new SvelteSet<string>();
	const board = $derived(later?.of === first() ? later.board : first());

	function take(next: BoardView) {
		const before = Object.fromEntries(board.rows.map((row) => [row.id, JSON.stringify(row)]));
		for (const row of next.rows) if (before[row.id] !== JSON.stringify(row)) changed.add(row.id);
		later = { of: first(), board: next };
		setTimeout(() => changed.clear(), washMs);
	}

	// Reaches outside: the clock, and the server while somebody looks.
	$effect(() => {
		let tag: string | null = null;
		const query = search();
		async function ask() {
			ticked = Date.now();
			if (document.hidden) return;
			const headers: Record<string, string> = tag ? { 'If-None-Match': tag } : {};
			const answer = await fetch(`/api/v1/shipments?view=board&${query}`, {
				headers,
				cache: 'no-store'
			}).catch(() => null);
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
		get board() {
			return board;
		},
		get nowMs() {
			return ticked ?? startMs();
		},
		changed
	};
}
