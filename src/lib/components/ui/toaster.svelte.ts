interface ToastRequest {
	id: number;
	text: string;
	onundo?: () => void;
}

let nextId = 1;

/** What stands at the bottom left now. Written by acts in the browser only, so no request sees another's. */
export const toasts = $state<ToastRequest[]>([]);

/** Says that an act is done, and offers to take it back. */
export function showToast(text: string, onundo?: () => void): void {
	toasts.push({ id: nextId++, text, onundo });
}

export function dropToast(id: number): void {
	const at = toasts.findIndex((toast) => toast.id === id);
	if (at >= 0) toasts.splice(at, 1);
}
