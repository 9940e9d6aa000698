import { createRawSnippet, flushSync, mount, unmount } from 'svelte';
import { afterEach, describe, expect, it } from 'vitest';
import Button from './Button.svelte';

const children = createRawSnippet(() => ({ render: () => '<span>Sign</span>' }));
let shown: Record<string, unknown> | undefined;

function show(props: Record<string, unknown>): HTMLButtonElement {
	shown = mount(Button, { target: document.body, props: { children, ...props } });
	flushSync();
	const button = document.querySelector('button');
	if (!button) throw new Error('no button was drawn');
	return button;
}

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

describe('a button', () => {
	it('acts when pressed and submits nothing by itself', () => {
		let presses = 0;
		const button = show({ onclick: () => presses++ });
		button.click();
		expect(presses).toBe(1);
		expect(button.type).toBe('button');
	});

	it('that cannot be pressed yet stays focusable, says why and does nothing', () => {
		let presses = 0;
		const button = show({ cannotYet: 'Two reads are missing.', onclick: () => presses++ });
		button.click();
		expect(presses).toBe(0);
		expect(button.disabled).toBe(false);
		expect(button.getAttribute('aria-disabled')).toBe('true');
		const reason = document.getElementById(button.getAttribute('aria-describedby') ?? '');
		expect(reason?.textContent).toBe('Two reads are missing.');
	});

	it('that works ignores a second press, so that nothing is sent twice', () => {
		let presses = 0;
		const button = show({ isWorking: true, type: 'submit', onclick: () => presses++ });
		const press = new MouseEvent('click', { bubbles: true, cancelable: true });
		button.dispatchEvent(press);
		expect(presses).toBe(0);
		expect(press.defaultPrevented).toBe(true);
		expect(button.getAttribute('aria-busy')).toBe('true');
	});
});
