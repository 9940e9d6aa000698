import { describe, expect, it } from 'vitest';
import { reportInput } from '../../../../tests/helpers/report-fixture';
import { supplierFacts } from './supplier-facts';

const rangeParts = [{ source: 'accuracy' as const, lowerHours: 7, raiseHours: 6 }];

function frozen() {
	const { frozen: record } = reportInput();
	const assessments = record.docket.assessments.map((one) => ({ ...one, rangeParts }));
	return { ...record, docket: { ...record.docket, assessments } };
}

describe('what a supplier is told of its load', () => {
	it('has what low to high is made of, beside each life', () => {
		const { lines } = supplierFacts(frozen());
		const assessed = lines.filter(({ remainingHours }) => remainingHours !== null);
		expect(assessed.length).toBeGreaterThan(0);
		for (const line of assessed) expect(line.rangeParts).toEqual(rangeParts);
	});

	it('names no holder but the supplier itself, and no place', () => {
		const facts = supplierFacts(frozen());
		expect(new Set(facts.assessment?.legs.map(({ holder }) => holder))).toEqual(new Set(['yours', '']));
		expect(facts.assessment?.legs.every(({ place }) => place === '')).toBe(true);
		const { docket } = frozen();
		const others = docket.handovers.slice(1).map(({ holder }) => holder);
		for (const other of others) expect(JSON.stringify(facts)).not.toContain(other);
	});
});
