import { goods } from './lane';
import type { LoadPlan } from './load';

const at = (day: number, clock: string) => ({ day, clock });

/** Loads of the last two months whose journeys are worth a look. */
export const pastStories: readonly LoadPlan[] = [
	{
		key: 'door left open',
		lane: 'lettuce',
		due: at(-3, '06:20'),
		lateHours: [0, 0.3],
		incidents: [{ leg: 0, afterHours: 4, hours: 2.6, airCelsius: 14 }],
		decided: {
			afterMinutes: 62,
			notify: true,
			outcomes: ['conditions'],
			condition: 'Ship first, within four days.',
			reasons: 'Two and a half hours in the open yard; life left is more than the order needs.'
		}
	},
	{
		key: 'late',
		lane: 'grapes',
		due: at(-9, '09:30'),
		lateHours: [2, 34],
		decided: {
			afterMinutes: 80,
			condition: 'Shorter date; move within a week.',
			reasons: 'A day and a half late at the border.'
		}
	},
	{
		key: 'gap',
		lane: 'asparagus',
		due: at(-15, '07:10'),
		rides: [{ gap: { leg: 1, afterHours: 3, hours: 2 } }],
		decided: { afterMinutes: 45 }
	},
	{
		key: 'stopped early',
		lane: 'cod',
		due: at(-18, '05:00'),
		rides: [{ stopsEarlyHours: 7 }],
		pulpCelsius: [0.6, 0.9],
		hold: { afterMinutes: 20, reason: 'The logger stopped seven hours before the door' },
		decided: {
			afterMinutes: 95,
			condition: 'Sell at the counter today and tomorrow.',
			reasons: 'Pulp and ice agree with the trace up to where it stops.'
		}
	},
	{
		key: 'two disagree',
		lane: 'tessil',
		due: at(-21, '07:30'),
		goods: [goods(['Strawberries', 'Strawberries, 10 × 400 g'], [320, 80], 18.5, 8)],
		photos: [{ shows: 'film', kind: 'damage', afterMinutes: 14, caption: 'Pallet 4, film open at the top' }],
		rides: [
			{ line: 1, position: 'Pallet 1, nose' },
			{ line: 1, position: 'Pallet 4, door end', offsetCelsius: 2.4 }
		],
		decided: {
			afterMinutes: 88,
			reasons: 'The two differ by more than their accuracies; the warmer one has been sent for calibration.',
			groups: [
				{ name: 'Pallets 1 to 3', pallets: 3, outcome: 'conditions', words: 'Grade before shelving.' },
				{
					name: 'Pallet 4, door end',
					pallets: 1,
					outcome: 'reject',
					words: 'Film open, fruit dried at the top',
					whereabouts: 'returned'
				}
			]
		}
	},
	{
		key: 'chilled tomatoes',
		lane: 'tomatoes',
		due: at(-24, '05:20'),
		lateHours: [0, 0.5],
		incidents: [{ leg: 1, afterHours: 2, hours: 11, airCelsius: 3.5 }],
		decided: {
			afterMinutes: 58,
			notify: true,
			condition: 'Ripe trade only, watch for pitting.',
			reasons: 'Ten hours under the chilling threshold.'
		},
		aftermath: {
			answer: { kind: 'acknowledge', afterHours: 8, text: 'The driver had mixed goods with salad at 4 °C.' }
		}
	},
	{
		key: 'vaccine warm',
		lane: 'vaccine',
		due: at(-27, '11:40'),
		lateHours: [0, 0.8],
		incidents: [{ leg: 1, afterHours: 3, hours: 1.7, airCelsius: 16 }],
		pulpCelsius: [6.9],
		hold: { afterMinutes: 12, reason: 'Above 8 °C in transit; stability to be asked' },
		decided: {
			afterMinutes: 240,
			notify: true,
			outcomes: ['conditions'],
			condition: 'Quarantine until the holder of the authorisation answers.',
			reasons: 'One excursion above 8 °C. The holder has been asked for stability data.'
		},
		aftermath: {
			answer: {
				kind: 'acknowledge',
				afterHours: 26,
				text: 'Covered by our stability budget. Letter follows by post.'
			}
		}
	},
	{
		key: 'no logger',
		lane: 'milk',
		due: at(-33, '06:30'),
		rides: [],
		pulpCelsius: [3.4, 3.6],
		decided: { afterMinutes: 30, reasons: 'No logger on this lane; decided on pulp and transit time.' }
	},
	{
		key: 'short count',
		lane: 'tulips',
		due: at(-36, '06:15'),
		short: 8,
		decided: { afterMinutes: 36 },
		aftermath: {
			claim: {
				afterHours: 30,
				against: 'hollin',
				fraction: 0.08,
				basis: 'Eight buckets short against the papers, signed by the driver.',
				then: [{ status: 'declined', afterHours: 160 }]
			}
		}
	},
	{
		key: 'undeclared',
		lane: 'grapes',
		due: at(-41, '10:10'),
		goods: [goods(['Table grapes', 'Table grapes, red, 9 kg'], [1200, 120], 15.9, null)],
		decided: {
			afterMinutes: 52,
			condition: 'Sample each morning.',
			reasons: 'No opening balance came with the papers.'
		}
	},
	{
		key: 'mill seal',
		lane: 'jb-lettuce',
		due: at(-19, '10:15'),
		seal: 'other',
		decided: { afterMinutes: 55 }
	}
];
