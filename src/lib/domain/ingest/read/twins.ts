import { celsiusFromScaled } from '../../units';
import type { Oddity } from '../ingestion';
import { oddityOf } from './oddities';
import type { Readable } from './readable';

/** Rows where the column in the other unit differs from the chosen one by more than both were rounded. */
export function twinOddities({ picked, gathered, values, unit, unitOf }: Readable): Oddity[] {
	return picked.twins.flatMap((twin) => {
		const other = gathered.values.find((v) => v.column === twin.index);
		const otherUnit = unitOf(twin);
		if (other === undefined || otherUnit === null) return [];
		const apart: number[] = [];
		for (let i = 0; i < gathered.count; i++) {
			if (values.isMissing[i] !== 0 || other.isMissing[i] !== 0) continue;
			const mine = celsiusFromScaled(values.mantissa[i] ?? 0, values.decimals[i] ?? 0, unit);
			const theirs = celsiusFromScaled(other.mantissa[i] ?? 0, other.decimals[i] ?? 0, otherUnit);
			const rounding = 0.5 / 10 ** (values.decimals[i] ?? 0) + 0.5 / 10 ** (other.decimals[i] ?? 0);
			if (Math.abs(mine - theirs) > rounding + 1e-9) apart.push(gathered.lines[i] ?? 0);
		}
		const used = oddityOf('other-unit-column', [gathered.lines[0] ?? 0], twin.name);
		return [used, oddityOf('twin-disagrees', apart, twin.name)].filter((oddity) => oddity !== null);
	});
}
