import type { SubmitFunction } from '@sveltejs/kit';
import { showToast } from '../ui/toaster.svelte';

/** Submits in place, keeps what was typed, and says so once it is done. */
export function saying(text: string): SubmitFunction {
	return () =>
		async ({ result, update }) => {
			await update({ reset: result.type === 'success' });
			if (result.type === 'redirect' || result.type === 'success') showToast(text);
		};
}
