import type { Excursion, LegUse } from '../../src/lib/domain/receiving/assessment';

const hourMs = 3_600_000;

/** Excursions of the invented journey; a trace that stayed cool has none. */
export function excursionsOfJourney(fromMs: number, warmth: number): Excursion[] {
	const at = (hours: number) => fromMs + hours * hourMs;
	const warm = { kind: 'too-warm', limitCelsius: 4, isInDoubt: false, isOpen: false } as const;
	const all: Excursion[] = [
		{
			...warm,
			severity: 'minor',
			fromMs: at(12.9),
			toMs: at(13.9),
			minutes: 60,
			extremeCelsius: 4.6,
			extremeAtMs: at(13.4),
			meanCelsius: 4.5,
			degreeMinutes: 22,
			costHours: 1.7,
			legs: [2]
		},
		{
			...warm,
			severity: 'critical',
			fromMs: at(69.9),
			toMs: at(80.1),
			minutes: 603,
			extremeCelsius: 11.3,
			extremeAtMs: at(75),
			meanCelsius: 8.7,
			degreeMinutes: 2896,
			costHours: 41.2,
			legs: [4, 5]
		},
		{
			kind: 'too-cold',
			severity: 'major',
			limitCelsius: -0.5,
			fromMs: at(89.3),
			toMs: at(91.5),
			minutes: 132,
			extremeCelsius: -1.1,
			extremeAtMs: at(90.4),
			meanCelsius: -0.8,
			degreeMinutes: 39,
			costHours: 2.3,
			legs: [5],
			isInDoubt: false,
			isOpen: false
		}
	];
	return warmth >= 1 ? all : warmth > 0.5 ? all.slice(1, 2) : [];
}

/** Six legs that cover the journey; allowance, over-use and its two parts add up. */
export function legsOfJourney(fromMs: number, toMs: number, warmth: number): LegUse[] {
	const plan = [
		['Olmarisa packhouse', 'cold room', 0, 12.5, 13.5, 1.7, 0],
		['Trascoll Freight', 'road', 12.5, 21.1, 9.2, 2.7, 0.1],
		['Merrow Line', 'sea, reefer container', 21.1, 67.3, 49.8, 1.2, 0.3],
		['Sarn Quay Cold Store', 'cross-dock', 67.3, 78.7, 5.9, 28.6, 7.4],
		['Anselm Road Transport', 'road', 78.7, 93.7, 14.6, 2.3, 1.7],
		['Pell Staithe, Dock 1', 'dock', 93.7, 95, 1, 0.2, 0.7]
	] as const;
	return plan.map(([holder, place, from, to, allowedHours, warm, late], i) => {
		const tooWarmHours = warm * warmth;
		return {
			ordinal: i + 1,
			handoverId: `handover-${i + 1}`,
			holder,
			place,
			fromMs: fromMs + from * hourMs,
			toMs: Math.min(fromMs + to * hourMs, toMs),
			plannedMinutes: Math.round((to - from) * 60 - late * 50),
			tookMinutes: Math.round((to - from) * 60),
			setPointCelsius: 0.5,
			allowedHours,
			usedHours: allowedHours + tooWarmHours + late,
			overHours: tooWarmHours + late,
			tooWarmHours,
			tooLateHours: late,
			shareOfUsed: 0.16,
			butForRemainingHours: 270,
			coveredFraction: i === 5 ? 0.94 : 1
		};
	});
}
