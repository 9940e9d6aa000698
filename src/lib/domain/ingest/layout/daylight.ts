import { foldWord } from '../times/month-names';
import type { Entry } from './table';

const words =
	/\b(dst|daylight( saving)?s?|summer ?time|sommerzeit|heure d.?ete|hora de verano|horario de verano|horario de verao|hora de verao|ora legale|zomertijd|czas letni|yaz saati|sommertid|kesaaika|letni cas)\b|夏令时|夏令時|夏时制|夏時間|サマータイム|летнее время|서머/;
const yes =
	/^\W*(on|yes|y|true|1|active|activated|enabled|observed|auto\w*|ja|aktiv\w*|ein|an|oui|active?e?|si|sim|ativ\w*|attiv\w*|aan|tak|wl\w*|evet|acik|да|вкл\w*|是|开|開|启用|有効|オン|예|\+?\s?1\s?h|\+?\s?60)(?!\p{L})/u;

/** Whether a line says that the clock keeps summer time; null where none speaks of it. */
export function daylightIn(entries: readonly Entry[], zoneText: string | null): boolean | null {
	const inZone = zoneText === null ? null : foldWord(zoneText);
	if (inZone !== null && words.test(inZone))
		return !/\b(no|off|not|without|ohne|sans|sin|nein|non|0|false|standard)\b/.test(inZone);
	const said = entries.find(
		({ key }) => words.test(key) && !/offset|start|begin|end|date|datum|from|to\b/.test(key)
	);
	return said === undefined ? null : yes.test(foldWord(said.value));
}
