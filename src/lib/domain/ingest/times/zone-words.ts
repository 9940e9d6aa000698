/** What letters such as CST may mean: a fixed offset, and the place whose clocks use it for part of the year. */
export interface ZoneMeaning {
	readonly minutes: number;
	/** IANA zone in which the letters are used. */
	readonly region: string;
}

type Entry = readonly [minutes: number, region: string];

/**
 * Letters of time zones. Where several places use the same ones all are listed, the likeliest in the trade first.
 * Source: abbreviations of the IANA time zone database; MEZ, MESZ and HNE, HAE as used in German and French.
 */
const words: Readonly<Record<string, readonly Entry[]>> = {
	wet: [[0, 'Europe/Lisbon']],
	west: [[60, 'Europe/Lisbon']],
	cet: [[60, 'Europe/Berlin']],
	mez: [[60, 'Europe/Berlin']],
	cest: [[120, 'Europe/Berlin']],
	mesz: [[120, 'Europe/Berlin']],
	mest: [[120, 'Europe/Berlin']],
	eet: [[120, 'Europe/Helsinki']],
	oez: [[120, 'Europe/Helsinki']],
	eest: [[180, 'Europe/Helsinki']],
	oesz: [[180, 'Europe/Helsinki']],
	bst: [
		[60, 'Europe/London'],
		[360, 'Asia/Dhaka']
	],
	ist: [
		[330, 'Asia/Kolkata'],
		[60, 'Europe/Dublin'],
		[120, 'Asia/Jerusalem']
	],
	idt: [[180, 'Asia/Jerusalem']],
	msk: [[180, 'Europe/Moscow']],
	trt: [[180, 'Europe/Istanbul']],
	sast: [[120, 'Africa/Johannesburg']],
	cat: [[120, 'Africa/Maputo']],
	wat: [[60, 'Africa/Lagos']],
	eat: [[180, 'Africa/Nairobi']],
	est: [[-300, 'America/New_York']],
	edt: [[-240, 'America/New_York']],
	hne: [[-300, 'America/Toronto']],
	hae: [[-240, 'America/Toronto']],
	cst: [
		[-360, 'America/Chicago'],
		[480, 'Asia/Shanghai']
	],
	cdt: [[-300, 'America/Chicago']],
	mst: [[-420, 'America/Denver']],
	mdt: [[-360, 'America/Denver']],
	pst: [[-480, 'America/Los_Angeles']],
	pdt: [[-420, 'America/Los_Angeles']],
	akst: [[-540, 'America/Anchorage']],
	akdt: [[-480, 'America/Anchorage']],
	hst: [[-600, 'Pacific/Honolulu']],
	ast: [
		[-240, 'America/Halifax'],
		[180, 'Asia/Riyadh']
	],
	adt: [[-180, 'America/Halifax']],
	nst: [[-210, 'America/St_Johns']],
	ndt: [[-150, 'America/St_Johns']],
	brt: [[-180, 'America/Sao_Paulo']],
	art: [[-180, 'America/Argentina/Buenos_Aires']],
	clt: [[-240, 'America/Santiago']],
	clst: [[-180, 'America/Santiago']],
	cot: [[-300, 'America/Bogota']],
	pet: [[-300, 'America/Lima']],
	gst: [[240, 'Asia/Dubai']],
	pkt: [[300, 'Asia/Karachi']],
	npt: [[345, 'Asia/Kathmandu']],
	ict: [[420, 'Asia/Bangkok']],
	wib: [[420, 'Asia/Jakarta']],
	sgt: [[480, 'Asia/Singapore']],
	hkt: [[480, 'Asia/Hong_Kong']],
	myt: [[480, 'Asia/Kuala_Lumpur']],
	pht: [[480, 'Asia/Manila']],
	awst: [[480, 'Australia/Perth']],
	jst: [[540, 'Asia/Tokyo']],
	kst: [[540, 'Asia/Seoul']],
	acst: [[570, 'Australia/Darwin']],
	acdt: [[630, 'Australia/Adelaide']],
	aest: [[600, 'Australia/Sydney']],
	aedt: [[660, 'Australia/Sydney']],
	nzst: [[720, 'Pacific/Auckland']],
	nzdt: [[780, 'Pacific/Auckland']]
};

const universal: ReadonlySet<string> = new Set(['z', 'utc', 'gmt', 'ut', 'uct', 'zulu']);

/** Everything a word of letters may mean as a zone; empty when it is none. Case is not heeded. */
export function zoneMeanings(word: string): readonly ZoneMeaning[] {
	const lower = word.trim().toLowerCase();
	if (universal.has(lower)) return [{ minutes: 0, region: 'UTC' }];
	if (!Object.hasOwn(words, lower)) return [];
	return (words[lower] ?? []).map(([minutes, region]) => ({ minutes, region }));
}

/** Minutes east of UTC of letters that mean one offset only; null otherwise. */
export function offsetOfWord(word: string): number | null {
	const meanings = zoneMeanings(word);
	const [only] = meanings;
	return only !== undefined && meanings.length === 1 ? only.minutes : null;
}
