import { fish } from './products/fish';
import { frozenAndDairy } from './products/frozen-and-dairy';
import { fruit } from './products/fruit';
import { notFood } from './products/not-food';
import type { DemoProduct } from './products/shape';
import { vegetables } from './products/vegetables';

/** The demo's catalogue. Life figures come from the tables named in each spec's sources; what has none says so. */
export const demoProducts: readonly DemoProduct[] = [
	...vegetables,
	...fruit,
	...fish,
	...frozenAndDairy,
	...notFood
];
