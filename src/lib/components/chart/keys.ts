/** What a key does to the chart; null leaves it to the browser. */
export type ChartAct =
	| { kind: 'step'; direction: 1 | -1 }
	| { kind: 'leg'; direction: 1 | -1 }
	| { kind: 'end'; direction: 1 | -1 }
	| { kind: 'zoom'; factor: number }
	| { kind: 'whole' }
	| null;

const directions: Record<string, 1 | -1> = { ArrowRight: 1, ArrowUp: 1, ArrowLeft: -1, ArrowDown: -1 };

export function actOfKey(key: string, hasShift: boolean, isZoomed: boolean): ChartAct {
	const direction = directions[key];
	if (direction) return { kind: hasShift ? 'leg' : 'step', direction };
	if (key === 'Home' || key === 'End') return { kind: 'end', direction: key === 'Home' ? -1 : 1 };
	if (key === '+' || key === '=') return { kind: 'zoom', factor: 0.5 };
	if (key === '-' || key === '−') return { kind: 'zoom', factor: 2 };
	return key === 'Escape' && isZoomed ? { kind: 'whole' } : null;
}
