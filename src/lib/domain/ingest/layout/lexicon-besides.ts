import type { Lexeme } from './lexicon';

/** Worked out from temperatures or about the instrument: never the temperature of the load. */
export const derived: Lexeme = {
	stems: [
		'delta',
		'differ',
		'gradient',
		'slope',
		'kinetic',
		'kinet',
		'cineti',
		'mkt',
		'batter',
		'akku',
		'cpu',
		'chip',
		'offset',
		'correction',
		'korrektur',
		'cumul',
		'degreemin'
	],
	whole: ['rate', 'dt', 'bat', 'batt', 'wetbulb', 'change', 'mcu', 'pcb'],
	within: ['Δ', 'δ', '/h', '/min', 'wet bulb', 'heat index', 'wind chill']
};
/** Ends of an allowed range where they stand still; two probes where they move. */
export const bound: Lexeme = {
	stems: ['upper', 'lower', 'obere', 'untere', 'superi', 'inferi', 'alarm'],
	whole: ['high', 'low', 'hi', 'lo', 'max', 'min', 'maximum', 'minimum', 'haut', 'bas', 'alta', 'baja'],
	within: []
};
