export interface OverUseBar {
	tooWarmPercent: number;
	tooLatePercent: number;
}

/** Both parts against the largest over-use of the table; a leg that saved life has no bar. */
export function overUseBar(tooWarmHours: number, tooLateHours: number, mostHours: number): OverUseBar {
	const at = (hours: number) => (mostHours > 0 ? (Math.max(0, hours) / mostHours) * 100 : 0);
	return { tooWarmPercent: at(tooWarmHours), tooLatePercent: at(tooLateHours) };
}
