import { goods } from './lane';
import type { LoadPlan } from './load';

const key = (name: string) => `staithe today ${name}`;

/** The docket at QA: three lots, three loggers, a warm cross-dock and a frozen tail. */
const atQa: LoadPlan = {
	key: key('blueberries'),
	lane: 'olmarisa',
	title: 'Blueberries for the weekend',
	due: { minutes: -245 },
	lateHours: [0, 0.1, 0.25, 0, 0.02],
	goods: [
		goods(['Blueberries', 'Blueberries, 12 × 125 g'], [960, 192], 14.4, 20, 8),
		goods(['Blueberries', 'Blueberries, 8 × 250 g'], [1120, 160], 16.2, 34, 8),
		goods(['Blueberries', 'Blueberries, 12 × 125 g'], [640, 160], 14.4, 49, 8)
	],
	rides: [
		{ line: 1, position: 'Pallet 2, nose, in fruit', exposure: 0.18 },
		{ line: 2, position: 'Pallet 9, middle, in fruit', exposure: 0.5, offsetCelsius: 0.3 },
		{
			line: 3,
			position: 'Pallet 16, door end, in fruit',
			exposure: 1,
			offsetCelsius: 0.2,
			gap: { leg: 2, afterHours: 27, hours: 2.2 }
		}
	],
	incidents: [
		{ leg: 1, afterHours: 0, hours: 1.2, airCelsius: 12 },
		{ leg: 3, afterHours: 0.8, hours: 9.6, airCelsius: 14 },
		{ leg: 4, afterHours: 6.4, hours: 3, airCelsius: -4 }
	],
	pulpCelsius: [0.8, 1.0, 1.4],
	doorNote: 'Cold at the door, but the tail pallets are wet under the film.',
	hold: { afterMinutes: 39, reason: 'Tail pallets wet, driver stood at the hub' },
	photos: [
		{ shows: 'seal', kind: 'seal', afterMinutes: 5, caption: 'Seal 0093187 before it was cut' },
		{ shows: 'display', kind: 'set-point', afterMinutes: 7, caption: 'Display of the unit at the door' },
		{ shows: 'film', kind: 'damage', afterMinutes: 33, caption: 'Tail pallets, wet under the film' }
	],
	intoStore: { minutes: 78, plannedMinutes: 45, place: 'chill room', dockCelsius: 2 },
	readAfterMinutes: 86,
	trimFirstMinutes: 30,
	notes: [
		{
			by: 'dock',
			afterMinutes: 42,
			text: 'Cold at the door, but the tail pallets are wet under the film. Driver says they stood outside at the hub "half the day".'
		},
		{ by: 'qa', afterMinutes: 200, text: 'Asked Sarn Quay for their door log.' }
	]
};

const strawberries: LoadPlan = {
	key: key('strawberries'),
	lane: 'tessil',
	due: { minutes: -140 },
	lateHours: [0, 0.42],
	goods: [
		goods(['Strawberries', 'Strawberries, 10 × 400 g'], [360, 90], 18.5, 12, 4),
		goods(['Strawberries', 'Strawberries, 20 × 227 g'], [240, 80], 21.4, 12, 4)
	],
	incidents: [{ leg: 1, afterHours: 6, hours: 6, airCelsius: 11 }],
	pulpCelsius: [1.4, 1.9],
	hold: { afterMinutes: 31, reason: 'Low under the need on both lots' }
};

const atTheDoor: readonly LoadPlan[] = [
	{
		key: key('fish'),
		lane: 'salmon',
		due: { minutes: -25 },
		lateHours: [0, 0.2],
		reads: 0,
		pulpCelsius: [0.9]
	},
	{
		key: key('lettuce'),
		lane: 'lettuce',
		due: { minutes: -20 },
		lateHours: [0, 0.05],
		rides: [
			{ line: 1, position: 'Pallet 3, nose' },
			{ line: 1, position: 'Pallet 10, door end', exposure: 0.8 }
		],
		reads: 1,
		question: 'two-probes'
	}
];

const expected: readonly LoadPlan[] = [
	{ key: key('tulips next'), lane: 'tulips', due: { minutes: 10 }, isExpected: true },
	{
		key: key('asparagus next'),
		lane: 'asparagus',
		due: { minutes: 45 },
		isExpected: true,
		rides: [
			{ line: 1, position: 'Pallet 1, nose' },
			{ line: 1, position: 'Pallet 5, door end' }
		]
	},
	{ key: key('tomatoes next'), lane: 'tomatoes', due: { minutes: 85 }, isExpected: true },
	{ key: key('grapes next'), lane: 'grapes', due: { minutes: 175 }, isExpected: true },
	{ key: key('cod next'), lane: 'cod', due: { minutes: 220 }, isExpected: true }
];

const done: readonly LoadPlan[] = [
	{
		key: key('milk'),
		lane: 'milk',
		due: { minutes: -79 },
		lateHours: [0, 0.07],
		decided: { afterMinutes: 38 }
	},
	{
		key: key('asparagus'),
		lane: 'asparagus',
		due: { minutes: -94 },
		lateHours: [0, -0.07],
		decided: { afterMinutes: 39 }
	},
	{
		key: key('smoked'),
		lane: 'smoked',
		due: { minutes: -165 },
		lateHours: [0, 0.2],
		incidents: [{ leg: 1, afterHours: 4, hours: 13, airCelsius: 26 }],
		pulpCelsius: [14.8, 16.1],
		doorNote: 'Unit off at the door. Driver: alarm since the ferry.',
		decided: {
			afterMinutes: 53,
			outcomes: ['reject'],
			reasons: 'Unit failed on the ferry. The pack rose above 3.3 °C for sixteen hours.',
			notify: true
		}
	},
	{
		key: key('tulips'),
		lane: 'tulips',
		due: { minutes: -230 },
		lateHours: [0, -0.08],
		decided: { afterMinutes: 46 }
	},
	{
		key: key('tomatoes'),
		lane: 'tomatoes',
		due: { minutes: -270 },
		lateHours: [0, 0.43],
		incidents: [{ leg: 1, afterHours: 3, hours: 8, airCelsius: 4 }],
		decided: { afterMinutes: 41, condition: 'Ship first, within three days; keep at 12 °C.' }
	},
	{
		key: key('broccoli'),
		lane: 'broccoli',
		goods: [goods(['Broccoli, crowns', 'Broccoli crowns, 8 kg on ice'], [280, 40], 13.2, 14)],
		due: { minutes: -295 },
		lateHours: [0, 0.07],
		decided: {
			afterMinutes: 51,
			reasons:
				'Cold throughout. Ice had slid off two pallets at the door end; they are probed again at noon.',
			groups: [
				{
					name: 'Pallets 1 to 5',
					pallets: 5,
					outcome: 'accept',
					whereabouts: 'store',
					place: 'chill room 2'
				},
				{
					name: 'Pallets 6 and 7, door end',
					pallets: 2,
					outcome: 'hold',
					words: 'Ice slid off the upper layers',
					awaited: { what: 'A second probing of the crowns', hours: 20 },
					whereabouts: 'quarantine',
					place: 'bay Q'
				}
			]
		}
	},
	{
		key: key('cod'),
		lane: 'cod',
		due: { minutes: -315 },
		lateHours: [0, -0.13],
		decided: { afterMinutes: 68 }
	}
];

/** Today at Pell Staithe: some done, two held, two at the door, five to come. */
export const todayStaithe: readonly LoadPlan[] = [atQa, strawberries, ...atTheDoor, ...expected, ...done];
