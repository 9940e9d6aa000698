const earliestMs = Date.UTC(1990, 0, 1);
/** A clock may be set a year wrong; one that is further ahead was never set. */
const aheadMs = 2 * 366 * 86_400_000;

/** Whether any of the moments can be one: after loggers came to be, and not years ahead of the upload. */
export function hasPlausibleDate(ms: Float64Array, uploadedMs: number): boolean {
	let isDated = false;
	for (const at of ms) {
		if (Number.isNaN(at)) continue;
		isDated = true;
		if (at >= earliestMs && at <= uploadedMs + aheadMs) return true;
	}
	return !isDated;
}
