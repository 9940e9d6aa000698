import type { LoadPlan } from './load';

const at = (day: number, clock: string) => ({ day, clock });

/** Loads of the last two months that were refused, wholly or in part, and what became of the money. */
export const pastRefused: readonly LoadPlan[] = [
	{
		key: 'failed unit',
		lane: 'salmon',
		due: at(-6, '04:40'),
		lateHours: [0, 1.4],
		incidents: [{ leg: 1, afterHours: 5, hours: 14, airCelsius: 19 }],
		pulpCelsius: [11.8, 13.2],
		doorNote: 'Unit showed alarm 32 since 21:40. Ice gone in the upper boxes.',
		hold: { afterMinutes: 18, reason: 'Pulp above the limit' },
		decided: {
			afterMinutes: 74,
			outcomes: ['reject'],
			reasons: 'Unit failed; no life for the order is left.',
			notify: true
		},
		aftermath: {
			answer: {
				kind: 'acknowledge',
				afterHours: 20,
				text: 'We have asked the haulier for the unit’s own log.'
			},
			claim: {
				afterHours: 26,
				against: 'bexcombe',
				fraction: 1,
				basis: 'Unit failed on the road leg; alarm unanswered for nine hours.',
				then: [
					{ status: 'noticed', afterHours: 2 },
					{ status: 'filed', afterHours: 70 }
				]
			}
		}
	},
	{
		key: 'frozen greens',
		lane: 'broccoli',
		due: at(-12, '05:50'),
		lateHours: [0, 0.1],
		incidents: [{ leg: 1, afterHours: 2, hours: 6, airCelsius: -4 }],
		pulpCelsius: [-0.4, 0.1],
		doorNote: 'Set-point on the unit reads −4 °C. Crowns glassy at the nose.',
		decided: {
			afterMinutes: 66,
			outcomes: ['reject'],
			reasons: 'Frozen at the nose; crowns glassy in the cut.',
			notify: true
		},
		aftermath: {
			answer: {
				kind: 'dispute',
				afterHours: 30,
				text: 'The load left us at 1 °C, see our dispatch probe. The set-point on the trailer was not ours.'
			},
			claim: {
				afterHours: 48,
				against: 'wade',
				fraction: 1,
				basis: 'Set-point −4 °C against +1 °C ordered.',
				then: [
					{ status: 'noticed', afterHours: 3 },
					{ status: 'filed', afterHours: 60 },
					{ status: 'settled', afterHours: 190 }
				]
			}
		}
	},
	{
		key: 'in part',
		lane: 'olmarisa',
		due: at(-30, '06:40'),
		lateHours: [0, 0, 3, 2, 0.2],
		rides: [
			{ line: 1, position: 'Pallet 1, nose, in fruit', exposure: 0.15 },
			{ line: 2, position: 'Pallet 10, door end, in fruit', exposure: 1, offsetCelsius: 0.4 }
		],
		incidents: [{ leg: 3, afterHours: 0.5, hours: 9, airCelsius: 19 }],
		hold: { afterMinutes: 25, reason: 'Door-end pallets warm' },
		decided: {
			afterMinutes: 140,
			outcomes: ['accept', 'reject'],
			reasons: 'Line 2 stood warm at the cross-dock and shows mould.',
			notify: true
		},
		aftermath: {
			answer: {
				kind: 'dispute',
				afterHours: 50,
				text: 'The balance at packing was eight hours less than you assume.'
			},
			claim: {
				afterHours: 72,
				against: 'sarn',
				fraction: 0.85,
				basis: 'Life lost at the cross-dock, door log not produced.',
				then: [
					{ status: 'noticed', afterHours: 4 },
					{ status: 'filed', afterHours: 120 }
				]
			}
		}
	},
	{
		key: 'warm peas',
		lane: 'peas',
		due: at(-44, '12:30'),
		lateHours: [0, 0.5],
		incidents: [{ leg: 1, afterHours: 2, hours: 4.6, airCelsius: 2 }],
		decided: {
			afterMinutes: 47,
			outcomes: ['reject'],
			reasons: 'Above −15 °C for over four hours; lumps in the bags.',
			notify: true
		},
		aftermath: {
			claim: {
				afterHours: 40,
				against: 'trascoll',
				fraction: 1,
				basis: 'Thawed and refrozen on the road.',
				then: [
					{ status: 'noticed', afterHours: 2 },
					{ status: 'settled', afterHours: 300 }
				]
			}
		}
	},
	{
		key: 'mill unit off',
		lane: 'cv-strawberries',
		due: at(-8, '06:30'),
		lateHours: [0, 2.2],
		incidents: [{ leg: 1, afterHours: 8, hours: 15, airCelsius: 21 }],
		pulpCelsius: [12.4, 14.9],
		decided: {
			afterMinutes: 71,
			outcomes: ['reject'],
			reasons: 'Reefer unit off for most of the night.',
			notify: true
		},
		aftermath: {
			answer: {
				kind: 'acknowledge',
				afterHours: 9,
				text: 'Precooler record attached to our invoice; released to you for salvage.'
			},
			claim: {
				afterHours: 20,
				against: 'quillane',
				fraction: 1,
				basis: 'Unit off, fuel out. Driver statement on the bill of lading.',
				then: [{ status: 'noticed', afterHours: 1 }]
			}
		}
	}
];
