import { zoneOffset } from '../../format-time';

/** The zones of the IANA list as this server knows them, each with what its clocks show now. */
export function listZones(now: Date, current?: string): { value: string; label: string }[] {
	const names = new Set([...Intl.supportedValuesOf('timeZone'), 'UTC', ...(current ? [current] : [])]);
	return [...names].sort().map((name) => ({
		value: name,
		label: `${name.replaceAll('_', ' ')}, ${zoneOffset(now, name)}`
	}));
}
