import type { Family } from '../fonts';
import { runsOf, type Run } from '../runs';
import { widthOf } from './words-room';

declare const escaped: unique symbol;
/** Markup made by this file alone: everything in it has been escaped. */
export type Node = string & { readonly [escaped]: true };

export interface TextLook {
	readonly family: Family;
	readonly size: number;
	readonly color: string;
	readonly anchor?: 'start' | 'middle' | 'end';
	readonly bold?: boolean;
	readonly turn?: number;
}

type Value = string | number;

function escapeText(text: string): string {
	return text
		.replace(/&/gu, '&amp;')
		.replace(/</gu, '&lt;')
		.replace(/>/gu, '&gt;')
		.replace(/"/gu, '&quot;')
		.replace(/'/gu, '&#39;');
}

function node(markup: string): Node {
	return markup as Node;
}

/** Attribute list; numbers to a hundredth of a point, which print cannot tell from more. */
export function attributes(values: Readonly<Record<string, Value>>): string {
	return Object.entries(values)
		.map(([name, value]) => `${name}="${typeof value === 'number' ? coordinate(value) : escapeText(value)}"`)
		.join(' ');
}

export function coordinate(points: number): string {
	return String(Math.round(points * 100) / 100);
}

export function element(
	name: string,
	values: Readonly<Record<string, Value>>,
	children: readonly Node[] = []
): Node {
	return node(`<${name} ${attributes(values)}>${children.join('')}</${name}>`);
}

/** One line of text, each run in a face that has its letters. */
export function textElement(x: number, y: number, text: string, look: TextLook): Node {
	const runs = runsOf(text.replace(/\n/gu, ' '), look.family);
	const [only] = runs;
	if (runs.length === 1 && only !== undefined) return runElement(x, y, only, look);
	// The renderer anchors a span by its first letter only, so that mixed faces are set one after the other.
	const widths = runs.map((run) => widthOf(run.text, run.font, look.size));
	const whole = widths.reduce((sum, width) => sum + width, 0);
	let at = x - (look.anchor === 'end' ? whole : look.anchor === 'middle' ? whole / 2 : 0);
	const parts = runs.map((run, i) => {
		const part = runElement(at, y, run, { ...look, anchor: 'start' });
		at += widths[i] ?? 0;
		return part;
	});
	return element('g', {}, parts);
}

function runElement(x: number, y: number, run: Run, look: TextLook): Node {
	const values = {
		x,
		y,
		'font-family': run.font,
		'font-size': look.size,
		'font-weight': look.bold ? 'bold' : 'normal',
		'text-anchor': look.anchor ?? 'start',
		fill: look.color,
		'xml:space': 'preserve',
		...(look.turn !== undefined && { transform: `rotate(${look.turn} ${coordinate(x)} ${coordinate(y)})` })
	};
	return element('text', values, [node(escapeText(run.text))]);
}

/** A path through points; a null lifts the pen. */
export function pathThrough(points: readonly (readonly [number, number] | null)[]): string {
	let isDown = false;
	let path = '';
	for (const point of points) {
		if (point === null) {
			isDown = false;
			continue;
		}
		path += `${isDown ? 'L' : 'M'}${coordinate(point[0])} ${coordinate(point[1])}`;
		isDown = true;
	}
	return path;
}
