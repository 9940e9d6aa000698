/** The six marks. Never colour alone: each has its own shape, and a word beside it. */
export const markKinds = ['accept', 'conditions', 'hold', 'reject', 'expected', 'at-the-door'] as const;
export type MarkKind = (typeof markKinds)[number];
export type MarkSize = 34 | 20 | 16 | 14 | 12;
