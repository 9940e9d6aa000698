import type { LoadPlan } from './load';

const key = (name: string) => `mill today ${name}`;

/** Today at Harrow Mill: fewer loads, in °F, in every state of a morning. */
export const todayMill: readonly LoadPlan[] = [
	{
		key: key('blueberries'),
		lane: 'cv-berries',
		due: { minutes: -175 },
		lateHours: [0, 0.6],
		incidents: [{ leg: 1, afterHours: 19, hours: 9, airCelsius: 15 }],
		pulpCelsius: [6.2, 8.1],
		seal: 'broken',
		doorNote: 'Seal cut. Driver says weigh station; no new seal on.',
		hold: { afterMinutes: 22, reason: 'Seal broken, pulp above the limit' },
		notes: [{ by: 'dock', afterMinutes: 25, text: 'Pulp 43 to 47 °F at the tail. Photos of the seal taken.' }]
	},
	{
		key: key('lettuce'),
		lane: 'jb-lettuce',
		due: { minutes: -40 },
		lateHours: [0, 0.4],
		reads: 0,
		pulpCelsius: [1.8]
	},
	{
		key: key('broccoli'),
		lane: 'jb-broccoli',
		due: { minutes: -12 },
		lateHours: [0, 0.05],
		reads: 0,
		question: 'no-unit'
	},
	{ key: key('strawberries next'), lane: 'cv-strawberries', due: { minutes: 25 }, isExpected: true },
	{ key: key('tomatoes next'), lane: 'jb-tomatoes', due: { minutes: 110 }, isExpected: true },
	{ key: key('ice cream next'), lane: 'ice-cream', due: { minutes: 190 }, isExpected: true },
	{
		key: key('strawberries'),
		lane: 'cv-strawberries',
		due: { minutes: -110 },
		lateHours: [0, 0.1],
		decided: { afterMinutes: 44 }
	},
	{
		key: key('tomatoes'),
		lane: 'jb-tomatoes',
		due: { minutes: -205 },
		lateHours: [0, 0.25],
		decided: { afterMinutes: 36 }
	},
	{
		key: key('ice cream'),
		lane: 'ice-cream',
		due: { minutes: -250 },
		lateHours: [0, 0.3],
		incidents: [{ leg: 1, afterHours: 9, hours: 2.5, airCelsius: -6 }],
		decided: {
			afterMinutes: 57,
			outcomes: ['conditions'],
			condition: 'Own label only; sell within eight weeks.',
			reasons: 'Defrost cycle ran long. Taken with a shorter date.'
		}
	}
];
