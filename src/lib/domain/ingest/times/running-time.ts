import { msPerDay } from './calendar';

const clock =
	/^([+-]?)(?:(\d{1,5})\s*(?:d|days?|tage?|j|jours?|dias?|g|giorni|dagen|,|\.)?[\s,]*\s[+]?|(\d{1,5})\.(?=\d+:))?(\d{1,6}):([0-5]\d)(?::([0-5]\d)(?:[.,](\d{1,9}))?)?$/i;
const spoken =
	/^(?:(\d+)\s*(?:d|days?|tage?|j|jours?|dias?)[\s,]*)?(?:(\d+)\s*(?:h|hrs?|hours?|std|stunden?|heures?|horas?|ore)[\s,]*)?(?:(\d+)\s*(?:m|mins?|minutes?|minuten?|minutos?|minuti)[\s,]*)?(?:(\d+(?:[.,]\d+)?)\s*(?:s|secs?|seconds?|sek|sekunden?|secondes?|segundos?)\.?)?$/i;
const iso = /^P(?:(\d+)D)?(?:T(?:(\d+)H)?(?:(\d+)M)?(?:(\d+(?:[.,]\d+)?)S)?)?$/;

const seconds = (text: string | undefined): number =>
	Math.round(Number((text ?? '0').replace(',', '.')) * 1000);
const count = (text: string | undefined): number => Number(text ?? 0);

/**
 * Milliseconds of a length of time: `26:10:00`, `1d 02:10:00`, `1.02:10:00`, `0 days 00:10:00`, `2h 05m`, `PT10M`;
 * NaN when the text is none.
 */
export function elapsedMs(text: string): number {
	const bare = text.trim();
	const match = clock.exec(bare);
	if (match !== null) {
		const ms =
			count(match[2] ?? match[3]) * msPerDay +
			(count(match[4]) * 60 + count(match[5])) * 60_000 +
			count(match[6]) * 1000 +
			Math.floor(count((match[7] ?? '').slice(0, 3).padEnd(3, '0')));
		return match[1] === '-' ? -ms : ms;
	}
	if (!/\d/.test(bare) || !/[a-z]/i.test(bare)) return NaN;
	const parts = iso.exec(bare) ?? spoken.exec(bare);
	if (parts === null) return NaN;
	return count(parts[1]) * msPerDay + (count(parts[2]) * 60 + count(parts[3])) * 60_000 + seconds(parts[4]);
}

/** Whether a cell that is no time of day is a length of time: more than a day, with days, or in words. */
export function isRunningTime(text: string): boolean {
	return (
		/^[+P\d-]/.test(text) && text.length <= 40 && /[:dhmsDHMSj]/.test(text) && !Number.isNaN(elapsedMs(text))
	);
}

/** Milliseconds since midnight of digits: `930` and `1430`, `93015`, `9.30`, or an hour alone; NaN for others. */
export function clockOfDigits(text: string, form: 'clock' | 'hour' | 'fraction'): number {
	const bare = text.trim();
	if (form === 'fraction') {
		const part = Number(bare.replace(',', '.'));
		return bare !== '' && part >= 0 && part <= 1 ? Math.round(part * 86_400) * 1000 : NaN;
	}
	const dotted = /^(\d{1,2})\.([0-5]\d)(?:\.([0-5]\d))?$/.exec(bare);
	if (dotted !== null && form === 'clock') {
		const ms = ((Number(dotted[1]) * 60 + Number(dotted[2])) * 60 + Number(dotted[3] ?? 0)) * 1000;
		return ms <= msPerDay ? ms : NaN;
	}
	if (!/^\d{1,6}(?:\.0+)?$/.test(bare)) return NaN;
	const value = Number(bare);
	if (form === 'hour') return value <= 24 ? value * 3_600_000 : NaN;
	const hasSeconds = bare.length > 4;
	const whole = hasSeconds ? Math.floor(value / 100) : value;
	const [hours, minutes, rest] = [Math.floor(whole / 100), whole % 100, hasSeconds ? value % 100 : 0];
	return hours > 24 || minutes > 59 || rest > 59 ? NaN : (hours * 60 + minutes) * 60_000 + rest * 1000;
}
