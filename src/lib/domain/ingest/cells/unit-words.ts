import type { TemperatureUnit } from '../../units';

const byLetter: Readonly<Record<string, TemperatureUnit>> = { c: 'celsius', f: 'fahrenheit', k: 'kelvin' };

/** Unit codes that are a whole cell or suffix. Sources: UN/ECE Rec 20 (CEL, FAH, KEL), UCUM (Cel, [degF], K). */
const wholeWords: Readonly<Record<string, TemperatureUnit>> = {
	c: 'celsius',
	f: 'fahrenheit',
	k: 'kelvin',
	cel: 'celsius',
	fah: 'fahrenheit',
	kel: 'kelvin',
	celsius: 'celsius',
	fahrenheit: 'fahrenheit',
	kelvin: 'kelvin',
	degc: 'celsius',
	degf: 'fahrenheit',
	degk: 'kelvin',
	gradc: 'celsius',
	gradcelsius: 'celsius',
	gradosc: 'celsius',
	degresc: 'celsius',
	degreesc: 'celsius',
	gradf: 'fahrenheit',
	gradosf: 'fahrenheit',
	degreesf: 'fahrenheit',
	degreescelsius: 'celsius',
	degreesfahrenheit: 'fahrenheit',
	celcius: 'celsius',
	celsjusza: 'celsius',
	centigrade: 'celsius',
	degcelsius: 'celsius',
	degfahrenheit: 'fahrenheit',
	gradicelsius: 'celsius',
	stc: 'celsius',
	'℃': 'celsius',
	'℉': 'fahrenheit'
};

/** Unit of a cell that holds nothing but a unit (`°C`, `[degF]`, `Cel`); null otherwise. */
export function wholeUnitOf(text: string): TemperatureUnit | null {
	const bare = text
		.toLowerCase()
		.replace(/[\s°º˚\ufffd.()[\]"'â_-]/g, '')
		.replace(/^[ø¡](?=[cf]$)/, '');
	return Object.hasOwn(wholeWords, bare) ? (wholeWords[bare] ?? null) : null;
}

/** In DOS code pages the degree sign is the ø of Windows, on old Macs the ¡; `Â` before it is UTF-8 read twice. */
const degreeSign = /(?:°|º|˚|\ufffd|(?<!\p{L})[ø¡]|\bdeg(?:rees?|\.)?|\bgrad)\s*([CFK])(?![a-z])/iu;
const spelled = /celsius|celcius|celsjusz|centigrad|fahrenheit|kelvin|℃|℉/i;
const bracketed = /[([{/]\s*\??([CFK])\s*[)\]}]/;
const bracketedWord = /[([{]\s*([a-z°. ]{2,12})\s*[)\]}]/i;
const trailing = /(?:^|[\s_,/.:-])\??([CFK])$|[a-z]([CFK])$|_([cfk])$/;

/** Temperature unit named inside a longer text such as a column head (`Temp. [°C]`, `temp_f`); null when none. */
export function unitWithin(text: string): TemperatureUnit | null {
	const word = spelled.exec(text)?.[0].toLowerCase();
	if (word !== undefined) {
		if (word.startsWith('f') || word === '℉') return 'fahrenheit';
		return word === 'kelvin' ? 'kelvin' : 'celsius';
	}
	const hit = degreeSign.exec(text) ?? bracketed.exec(text) ?? trailing.exec(text.trim());
	const letter = hit?.[1] ?? hit?.[2] ?? hit?.[3];
	if (letter !== undefined) return byLetter[letter.toLowerCase()] ?? null;
	const inside = bracketedWord.exec(text)?.[1];
	return inside === undefined ? null : wholeUnitOf(inside);
}

const otherUnits =
	/^[[(]?\s*(%|%\s?r\.?\s?[hfv]\.?|%\s?[hu]\.?\s?r\.?|rh|p1|lux|lx|g|v|mv|hpa|kpa|mbar|bar|ppm|s|sec|min|h|m\/s|a93)\s*[\])]?$/i;

/** True for a cell that holds a unit of anything: what a row of units is made of. */
export function isUnitCell(text: string): boolean {
	return wholeUnitOf(text) !== null || otherUnits.test(text.trim());
}
