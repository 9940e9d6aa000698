/** The light set: paper is white whatever the reader's screen prefers. */
export const palette = {
	ink: '#17212b',
	ink2: '#55606a',
	rule: '#d9d3c5',
	edge: '#837c6b',
	tar: '#22343c',
	kelp: '#2b6a4d',
	rope: '#8f5c0a',
	ropeWash: '#f8ecd4',
	ropeBand: '#e3b661',
	hull: '#9e1f33',
	deep: '#3b4c9b',
	deepWash: '#e6e9f6',
	sheet: '#ffffff'
} as const;

/** Sizes in points: three quarters of the screen's pixels, drawn in a little where a page must hold a journey. */
export const sizePoints = {
	title: 15,
	section: 10.8,
	verdict: 16.5,
	life: 25.5,
	number: 10.2,
	body: 9.4,
	table: 9,
	figure: 8.4,
	second: 8,
	label: 8,
	chartFigure: 7.6,
	chartWord: 8.4,
	smallest: 7.5
} as const;
