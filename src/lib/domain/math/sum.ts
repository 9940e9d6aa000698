/**
 * A running sum that carries what rounding dropped, so that a million small intervals add up as one would.
 * Source: Neumaier, Rundungsfehleranalyse einiger Verfahren zur Summation endlicher Summen, ZAMM 54 (1974).
 */
export class RunningSum {
	#sum = 0;
	#carry = 0;

	add(term: number): void {
		const next = this.#sum + term;
		this.#carry += Math.abs(this.#sum) >= Math.abs(term) ? this.#sum - next + term : term - next + this.#sum;
		this.#sum = next;
	}

	get total(): number {
		return this.#sum + this.#carry;
	}
}

/** Sum of the terms, compensated. */
export function compensatedSum(terms: Iterable<number>): number {
	const sum = new RunningSum();
	for (const term of terms) sum.add(term);
	return sum.total;
}
