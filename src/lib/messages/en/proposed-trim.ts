import type { ProposedTrim } from '../../domain/custody/propose-trims';
import type { TemperatureUnit } from '../../domain/units';
import { temperature, temperatureSign } from '../../format';

/** What an end of a trace looks like, without judging it. */
export function proposedTrimText(
	{ end, outermostCelsius, restingCelsius }: ProposedTrim,
	unit: TemperatureUnit
): string {
	const degrees = (celsius: number) => `${temperature(celsius, unit, 'en')} ${temperatureSign(unit)}`;
	const [out, rest] = [degrees(outermostCelsius), degrees(restingCelsius)];
	return end === 'from'
		? `Begins at ${out} and runs to ${rest}, where it rests: perhaps before the logger lay with the goods.`
		: `Leaves ${rest}, where it rested, and ends at ${out}: perhaps after the logger was taken out.`;
}
