import { fish } from './fish';
import { frozen } from './frozen';
import { produce } from './produce';
import type { StartingSpec } from './starting-spec';

const all: readonly StartingSpec[] = [...produce, ...fish, ...frozen].sort((a, b) =>
	a.key < b.key ? -1 : 1
);

/** Every product with published figures to begin from, by name. Whoever copies one enters needs and limits, and signs. */
export function listStartingSpecs(): readonly StartingSpec[] {
	return all;
}

/** The one of a key; null of none. */
export function findStartingSpec(key: string): StartingSpec | null {
	return all.find((starting) => starting.key === key) ?? null;
}
