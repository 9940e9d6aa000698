import { exp } from '../math/exp';
import { ln } from '../math/ln';
import { RunningSum } from '../math/sum';
import { celsiusFromKelvin, kelvinFromCelsius } from '../units';

/** kJ/mol, the only physical default of the engine. Source: USP 29 ⟨1160⟩, "unless more accurate information". */
export const customaryActivationEnergy = 83.144;
/** J/(mol·K) as printed in USP ⟨1160⟩, so that the customary energy gives ΔH/R = 10 000 K. */
const printedGasConstant = 8.3144;

/** ΔH/R in kelvin; null: the customary energy. */
function theta(activationEnergyKilojoulesPerMole: number | null): number {
	return ((activationEnergyKilojoulesPerMole ?? customaryActivationEnergy) * 1000) / printedGasConstant;
}

/**
 * Mean kinetic temperature of readings that each stand for a weight (any unit of time).
 * TK = (ΔH/R) / −ln(Σ w e^(−ΔH/RT) / Σ w). Source: USP ⟨1160⟩, Haynes 1971.
 * The exponent of the warmest reading is taken out first, so that no cold is too deep for a double.
 * Null where no reading has weight.
 */
export function meanKineticCelsius(
	celsius: ArrayLike<number>,
	weights: ArrayLike<number>,
	activationEnergyKilojoulesPerMole: number | null = null
): number | null {
	const shares = boltzmannShares(celsius, activationEnergyKilojoulesPerMole);
	const sum = new RunningSum();
	const weight = new RunningSum();
	for (let i = 0; i < celsius.length; i++) {
		sum.add((weights[i] as number) * shares.at(i));
		weight.add(weights[i] as number);
	}
	return weight.total > 0 ? shares.meanKinetic(sum.total / weight.total) : null;
}

/** The shares of temperatures by an activation energy; null: the customary one. */
export function boltzmannShares(
	celsius: ArrayLike<number>,
	activationEnergyKilojoulesPerMole: number | null
): BoltzmannShares {
	return new BoltzmannShares(celsius, theta(activationEnergyKilojoulesPerMole));
}

/** e^(−ΔH/RT) of each reading relative to the warmest one's; 1 there, so a mean of shares is between 0 and 1. */
export class BoltzmannShares {
	readonly #shares: Float64Array;
	readonly #warmestKelvin: number;
	readonly #energy: number;

	constructor(celsius: ArrayLike<number>, energy: number) {
		this.#energy = energy;
		let warmest = -Infinity;
		for (let i = 0; i < celsius.length; i++) warmest = Math.max(warmest, celsius[i] as number);
		this.#warmestKelvin = kelvinFromCelsius(warmest);
		this.#shares = new Float64Array(celsius.length);
		for (let i = 0; i < celsius.length; i++) {
			// Loggers repeat themselves: the exponential is taken where the temperature changes.
			const isRepeated = i > 0 && celsius[i] === celsius[i - 1];
			this.#shares[i] = isRepeated ? (this.#shares[i - 1] as number) : this.#shareAt(celsius[i] as number);
		}
	}

	#shareAt(celsius: number): number {
		const kelvin = kelvinFromCelsius(celsius);
		return exp((this.#energy * (kelvin - this.#warmestKelvin)) / (kelvin * this.#warmestKelvin));
	}

	at(index: number): number {
		return this.#shares[index] as number;
	}

	meanKinetic(meanShare: number): number {
		return celsiusFromKelvin(this.#energy / (this.#energy / this.#warmestKelvin - ln(meanShare)));
	}
}

/**
 * The worst mean kinetic temperature over any `windowMs` within the readings; over all of them where they span less.
 * Each reading holds until the next, so the mean over a sliding window is worst where the window begins or ends at
 * a reading: those windows are tried, no others need be.
 */
export function worstWindowMeanKinetic(
	celsius: ArrayLike<number>,
	weightsMs: ArrayLike<number>,
	windowMs: number,
	activationEnergyKilojoulesPerMole: number | null = null
): number | null {
	const shares = boltzmannShares(celsius, activationEnergyKilojoulesPerMole);
	const { ends, areas } = cumulated(shares, weightsMs);
	const spanMs = ends[ends.length - 1] ?? 0;
	if (spanMs <= windowMs) return meanKineticCelsius(celsius, weightsMs, activationEnergyKilojoulesPerMole);
	const areaUntil = areaReader(shares, ends, areas);
	const areaUntilEnd = areaReader(shares, ends, areas);
	let worst = 0;
	for (let i = -1; i < ends.length; i++) {
		const edge = i < 0 ? 0 : (ends[i] as number);
		const edgeArea = i < 0 ? 0 : (areas[i] as number);
		if (edge + windowMs <= spanMs) worst = Math.max(worst, areaUntilEnd(edge + windowMs) - edgeArea);
		if (edge >= windowMs) worst = Math.max(worst, edgeArea - areaUntil(edge - windowMs));
	}
	return shares.meanKinetic(worst / windowMs);
}

/** Time and share-weighted time up to the end of each reading's stretch. */
function cumulated(shares: BoltzmannShares, weightsMs: ArrayLike<number>) {
	const ends = new Float64Array(weightsMs.length);
	const areas = new Float64Array(weightsMs.length);
	const time = new RunningSum();
	const area = new RunningSum();
	for (let i = 0; i < weightsMs.length; i++) {
		time.add(weightsMs[i] as number);
		area.add((weightsMs[i] as number) * shares.at(i));
		ends[i] = time.total;
		areas[i] = area.total;
	}
	return { ends, areas };
}

/** Reads the area up to a time; times must be asked in ascending order. */
function areaReader(
	shares: BoltzmannShares,
	ends: Float64Array,
	areas: Float64Array
): (ms: number) => number {
	let at = 0;
	return (ms) => {
		while (at + 1 < ends.length && (ends[at] as number) < ms) at++;
		return (areas[at] as number) - ((ends[at] as number) - ms) * shares.at(at);
	};
}
