import type { SubmitFunction } from '@sveltejs/kit';
import { showToast } from '../ui/toaster.svelte';

/** Submits in place, keeps what was typed, and says so once it is done; a form that adds to a list is emptied then. */
export function saying(text: string, { isEmptied = false } = {}): SubmitFunction {
	return () =>
		async ({ result, update, formElement }) => {
			await update({ reset: false });
			if (result.type !== 'redirect' && result.type !== 'success') return;
			if (isEmptied) formElement.reset();
			showToast(text);
		};
}
