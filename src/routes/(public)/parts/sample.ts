/* The docket of the parts page; an invented one. */
export const places = ['Arrivals', 'Dockets', 'Claims', 'Specs', 'Partners', 'Record'].map((word) => ({
	href: `/parts#${word.toLowerCase()}`,
	word,
	isCurrent: word === 'Dockets'
}));

export const boxes = [
	{ label: 'From', value: 'Olmarisa Berry Growers', note: 'Packhouse 2, GLN 0614141000210' },
	{ label: 'To', value: 'Pell Staithe, Dock 1', note: 'GLN 9506000050010' },
	{ label: 'Carrier at the door', value: 'Anselm Road Transport', note: 'Fifth of six custodians' },
	{ label: 'Trailer and set-point', value: 'AR-4471, 0.5 °C', note: 'Supply air at the door 0.9 °C' },
	{ label: 'Seal', value: '0093187, intact', note: 'As on the papers' },
	{ label: 'Papers', value: 'CMR note 118402', note: 'Reservation noted 06:02' },
	{ label: 'Arrived', value: '05:52 CEST', note: 'Due 05:30, in the chill room 07:10' },
	{ label: 'Pulp at the door', value: '0.8, 1.0, 1.4 °C', note: 'Nose, middle, tail of the load' }
];

export const notes = [
	{
		id: 'a',
		text: 'Cold at the door, but the tail pallets are wet under the film. Driver says they stood outside at the hub “half the day”.',
		by: 'D. Marsh, 06:34'
	},
	{ id: 'b', text: 'Asked Sarn Quay for their door log.', by: 'R. Calloway, 09:12' }
];

export const recordEntries = [
	{ at: '05:52', text: 'Arrival logged, D. Marsh' },
	{ at: '06:02', text: 'Reservation on the CMR note' },
	{ at: '06:31', text: 'Put on hold, D. Marsh' },
	{ at: '07:24', text: 'Third logger read' },
	{ at: '08:10', text: 'Trims made, R. Calloway' },
	{ at: '09:12', text: 'Note added, R. Calloway' }
];

export const lines = [
	{
		ordinal: 1,
		product: 'Blueberries, 12 × 125 g',
		lot: 'OB-26089-1',
		cases: 960,
		sscc: '1 0614141 000418401 2',
		pallets: 5,
		logger: 'L1',
		value: 297.6,
		low: 290.4,
		high: 307.2,
		mark: 'accept',
		word: 'Accept'
	},
	{
		ordinal: 2,
		product: 'Blueberries, 8 × 250 g',
		lot: 'OB-26089-2',
		cases: 1120,
		sscc: '1 0614141 000418406 7',
		pallets: 7,
		logger: 'L2',
		value: 271.2,
		low: 261.6,
		high: 280.8,
		mark: 'conditions',
		word: 'Accept with conditions'
	},
	{
		ordinal: 3,
		product: 'Blueberries, 12 × 125 g',
		lot: 'OB-26089-4',
		cases: 640,
		sscc: '1 0614141 000418413 5',
		pallets: 4,
		logger: 'L3',
		value: 242.4,
		low: 232.8,
		high: 252,
		mark: 'reject',
		word: 'Reject'
	}
] as const;

/** Legs: in whose hands, planned and taken minutes, hours of life. */
export const legs = [
	{
		holder: 'Olmarisa packhouse',
		place: 'cold room, set 0.5 °C',
		from: '08:10',
		planned: 750,
		took: 750,
		allowed: 13.5,
		used: 15.2,
		warm: 1.7,
		late: 0
	},
	{
		holder: 'Trascoll Freight',
		place: 'road, set 0.5 °C',
		from: '20:40',
		planned: 510,
		took: 515,
		allowed: 9.2,
		used: 12,
		warm: 2.7,
		late: 0.1
	},
	{
		holder: 'Merrow Line',
		place: 'sea, reefer container, set 0.5 °C',
		from: '05:15',
		planned: 2760,
		took: 2775,
		allowed: 49.8,
		used: 51.3,
		warm: 1.2,
		late: 0.3
	},
	{
		holder: 'Sarn Quay Cold Store',
		place: 'cross-dock, set 1.0 °C',
		from: '03:30',
		planned: 300,
		took: 680,
		allowed: 5.9,
		used: 41.9,
		warm: 28.6,
		late: 7.4
	},
	{
		holder: 'Anselm Road Transport',
		place: 'road, set 0.5 °C',
		from: '14:50',
		planned: 810,
		took: 902,
		allowed: 14.6,
		used: 18.6,
		warm: 2.3,
		late: 1.7
	},
	{
		holder: 'Pell Staithe, Dock 1',
		place: 'dock, set 2.0 °C',
		from: '05:52',
		planned: 45,
		took: 78,
		allowed: 1,
		used: 1.9,
		warm: 0.2,
		late: 0.7
	}
];
