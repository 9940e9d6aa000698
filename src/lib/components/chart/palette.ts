export const inks = [
	'paper',
	'sheet',
	'ink',
	'ink2',
	'rule',
	'edge',
	'rope',
	'rope-wash',
	'rope-band',
	'hull',
	'deep',
	'deep-wash'
] as const;

/** Colours of the set that is shown, as a canvas takes them. */
export type Palette = Record<(typeof inks)[number], string>;

/** A canvas knows no custom properties: each is resolved on a probe inside the chart, so that a nested set counts too. */
export function readPalette(host: HTMLElement): Palette {
	const probe = document.createElement('span');
	host.append(probe);
	const read = (name: string) => {
		probe.style.color = `var(--${name})`;
		return getComputedStyle(probe).color;
	};
	const palette = {
		paper: read('paper'),
		sheet: read('sheet'),
		ink: read('ink'),
		ink2: read('ink2'),
		rule: read('rule'),
		edge: read('edge'),
		rope: read('rope'),
		'rope-wash': read('rope-wash'),
		'rope-band': read('rope-band'),
		hull: read('hull'),
		deep: read('deep'),
		'deep-wash': read('deep-wash')
	} satisfies Palette;
	probe.remove();
	return palette;
}

/** Calls back whenever another set is shown, by the system or by data-theme; gives the way to stop. */
export function onThemeChange(changed: () => void): () => void {
	const system = window.matchMedia('(prefers-color-scheme: dark)');
	system.addEventListener('change', changed);
	const named = new MutationObserver(changed);
	named.observe(document.documentElement, { attributes: true, attributeFilter: ['data-theme'] });
	return () => {
		system.removeEventListener('change', changed);
		named.disconnect();
	};
}
