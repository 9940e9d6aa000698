import { hoursPerDay } from '../../domain/units';

export interface LifeRuleDrawing {
	/** All in percent of the rule's length. */
	lowPercent: number;
	highPercent: number;
	neededPercent: number | null;
	/** From the high to the need; null where the need is met. */
	shortPercent: { from: number; to: number } | null;
	ticks: { percent: number; isMajor: boolean; days: number }[];
}

export interface LifeRuleInput {
	lowHours: number;
	highHours: number;
	neededHours: number | null;
	fullHours: number;
}

/** Days between two named ticks, so that three to four stand on the rule. */
function majorStep(days: number): number {
	return [1, 2, 3, 6, 7, 14, 28, 56, 91, 182].find((step) => days / step <= 4.5) ?? 364;
}

/** Where everything stands on the life rule: zero to the full shelf life, a tick a day. */
export function drawLifeRule({
	lowHours,
	highHours,
	neededHours,
	fullHours
}: LifeRuleInput): LifeRuleDrawing {
	const at = (hours: number) => Math.min(100, Math.max(0, (hours / fullHours) * 100));
	const days = fullHours / hoursPerDay;
	const major = majorStep(days);
	const minor = days <= 40 ? 1 : major;
	const ticks = [];
	for (let day = 0; day <= days + 1e-9; day += minor) {
		ticks.push({ percent: (day / days) * 100, isMajor: day % major === 0, days: day });
	}
	const isShort = neededHours !== null && neededHours > highHours;
	return {
		lowPercent: at(lowHours),
		highPercent: at(highHours),
		neededPercent: neededHours === null ? null : at(neededHours),
		shortPercent: isShort ? { from: at(highHours), to: at(neededHours) } : null,
		ticks
	};
}
