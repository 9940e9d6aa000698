import type { Family } from '../fonts';
import { runsOf } from '../runs';

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
	return text.replace(/&/gu, '&amp;').replace(/</gu, '&lt;').replace(/>/gu, '&gt;').replace(/"/gu, '&quot;').replace(/'/gu, '&#39;');
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

export function element(name: string, values: Readonly<Record<string, Value>>, children: readonly Node[] = []): Node {
	return node(`<${name} ${attributes(values)}>${children.join('')}</${name}>`);
}

/** One line of text, each run in a face that has its letters. */
export function textElement(x: number, y: number, text: string, look: TextLook): Node {
	const spans = runsOf(text.replace(/\n/gu, ' '), look.family).map((run) =>
		node(`<tspan ${attributes({ 'font-family': run.font })}>${escapeText(run.text)}</tspan>`)
	);
	const values = {
		x,
		y,
		'font-family': look.family,
		'font-size': look.size,
		'font-weight': look.bold ? 'bold' : 'normal',
		'text-anchor': look.anchor ?? 'start',
		fill: look.color,
		'xml:space': 'preserve',
		...(look.turn !== undefined && { transform: `rotate(${look.turn} ${coordinate(x)} ${coordinate(y)})` })
	};
	return element('text', values, spans);
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
