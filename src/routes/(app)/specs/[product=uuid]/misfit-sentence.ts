import type { Misfit } from '$lib/components/spec/misfit';
import type { TemperatureUnit } from '$lib/domain/units';
import { lifeDays, percent, temperature, temperatureSign } from '$lib/format';

/** "At 5.0 °C source 2 says 14.0 d; this curve says 11.8 d, 15 % less." */
export function misfitSentence(misfit: Misfit, unit: TemperatureUnit): string {
	const { celsius, source, publishedHours, curveHours, fraction } = misfit;
	const at = `At ${temperature(celsius, unit, 'en')} ${temperatureSign(unit)}`;
	const off = `${percent(Math.abs(fraction), 0, 'en')} % ${fraction < 0 ? 'less' : 'more'}`;
	return `${at} source ${source} says ${lifeDays(publishedHours, 'en')} d; this curve says ${lifeDays(curveHours, 'en')} d, ${off}.`;
}
