import { IANAZone } from 'luxon';
import { spelledZone } from './spelled-zones';
import { offsetOfWord, zoneMeanings } from './zone-words';

/** Offset text such as `+02:00` of minutes east of UTC. */
export function offsetText(minutes: number): string {
	const positive = Math.abs(minutes);
	const two = (n: number): string => String(n).padStart(2, '0');
	return `${minutes < 0 ? '-' : '+'}${two(Math.floor(positive / 60))}:${two(positive % 60)}`;
}

const offsetPattern =
	/^\(?\s*(?:utc|gmt|z)?\s*(?:offset)?\s*([+\-−–])\s*(\d{1,2})(?::?(\d{2}))?\s*h?\)?(?:\s|$|\()/i;

/** Minutes of a fixed offset (`+02:00`, `UTC+2`, `Z`, `CET`), or null. */
export function fixedOffsetOf(text: string): number | null {
	const bare = text.trim();
	const word = offsetOfWord(bare.replace(/^\((.*)\)$/, '$1'));
	if (word !== null) return word;
	if (/^(?:utc|gmt)\s*±?\s*0{1,2}(?::?00)?$/i.test(bare)) return 0;
	const match = offsetPattern.exec(bare);
	if (match === null) return null;
	const minutes = Number(match[2]) * 60 + Number(match[3] ?? 0);
	if (minutes > 14 * 60 || Number(match[3] ?? 0) > 59) return null;
	return match[1] === '+' ? minutes : -minutes;
}

const ianaPattern = /\b[A-Z][A-Za-z_]+\/[A-Za-z_]+(?:[-+][A-Za-z0-9]+)*(?:\/[A-Za-z_]+)?/i;

/** The IANA zone written somewhere in a text, as the database spells it; null without one. */
export function ianaWithin(text: string): string | null {
	const found = ianaPattern.exec(text.replace(/(\/[A-Z][a-z]+) (?=[A-Z][a-z]+)/g, '$1_'))?.[0];
	if (found === undefined || /^[a-z]\//i.test(found)) return null;
	const spelled = found
		.toLowerCase()
		.replace(/(^|[/_-])([a-z])/g, (_, before: string, letter: string) => before + letter.toUpperCase())
		.replace(/^Etc\/(Gmt|Utc)/, (name) => `Etc/${name.slice(4).toUpperCase()}`);
	const known = [found, spelled].find((zone) => IANAZone.isValidZone(zone));
	return known ?? null;
}

const regions = ['Europe', 'America', 'Asia', 'Australia', 'Africa', 'Pacific', 'Atlantic'] as const;

/** The zone of the first city named after an offset, as desktop systems list them, whose winter offset is the one said. */
function zoneOfCities(text: string): string | null {
	const match = /^\((?:utc|gmt)\s*([+\-−]\d{1,2}:?\d{2})?\)\s*(.+)$/i.exec(text);
	if (match === null) return null;
	const named = spelledZone(match[2] ?? '');
	if (named !== null) return named;
	const minutes = match[1] === undefined ? 0 : fixedOffsetOf(match[1]);
	for (const city of (match[2] ?? '').split(',')) {
		const place = city.trim().replace(/\s+/g, '_');
		const zone = regions
			.map((region) => `${region}/${place}`)
			.find((name) => /^[A-Z]\w+\/[A-Z][A-Za-z_-]+$/.test(name) && IANAZone.isValidZone(name));
		if (zone !== undefined && minutes === winterMinutes(zone)) return zone;
	}
	return null;
}

/** The smaller of the offsets of January and July 2024: what systems list a zone under. */
function winterMinutes(zone: string): number {
	const iana = IANAZone.create(zone);
	return Math.min(iana.offset(Date.UTC(2024, 0, 15)), iana.offset(Date.UTC(2024, 6, 15)));
}

/** The zone a text names, as an IANA name or a fixed offset; null when it names none that is known or only one. */
export function zoneNamedBy(text: string): string | null {
	const bare = text.trim().replace(/^["']|["']$/g, '');
	const named = ianaWithin(bare) ?? spelledZone(bare) ?? zoneOfCities(bare);
	if (named !== null) return named;
	const fixed = fixedOffsetOf(bare);
	return fixed === null ? null : offsetText(fixed);
}

export type OffsetAt = (utcMs: number) => number;

/** Minutes east of UTC at an instant in a zone; fixed offsets and IANA names alike. */
export function offsetAtOf(zone: string): OffsetAt {
	const fixed = fixedOffsetOf(zone);
	if (fixed !== null) return () => fixed;
	const iana = IANAZone.create(zone);
	if (!iana.isValid) return () => 0;
	return (utcMs) => iana.offset(utcMs);
}

/** Whether a text is a fixed offset or an IANA zone that this engine knows. */
export function isZone(text: string): boolean {
	// Engines also know letters such as IST, each in one of their meanings: those are not a zone by themselves.
	return fixedOffsetOf(text) !== null || (zoneMeanings(text).length === 0 && IANAZone.isValidZone(text));
}
