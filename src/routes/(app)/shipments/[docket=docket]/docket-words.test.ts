import { describe, expect, it } from 'vitest';
import { reportInput } from '../../../../../tests/helpers/report-fixture';
import type { DocketView } from '$lib/schemas/docket';
import { lifeNotKnown, quantitiesOf } from './docket-words';

const { docket: facts } = reportInput().frozen;
const docket: DocketView = {
	...facts,
	stage: 'done',
	clocks: [],
	signatures: [],
	notices: [],
	claimId: null,
	record: []
};
const [line] = docket.lines;
if (!line) throw new Error('The fixture has no line.');
const unknown = { ...line, remainingHours: null };

describe('why a life is not known', () => {
	it('is nothing where it is known', () => {
		expect(lifeNotKnown(docket, line)).toBeNull();
	});

	it('names the missing spec before it speaks of reads', () => {
		expect(lifeNotKnown(docket, { ...unknown, fullLifeHours: 0 })).toBe('no spec was in force');
	});

	it('tells a missing read from one that lies outside custody', () => {
		expect(lifeNotKnown({ ...docket, loggers: [] }, unknown)).toBe('no read yet');
		expect(lifeNotKnown(docket, unknown)).toBe('no reading in custody');
	});
});

describe('the quantities of a load taken in part', () => {
	it('say what came in and what did not', () => {
		// The fixture's three lines: 5 pallets accepted, 6 with conditions, 7 refused.
		expect(quantitiesOf(docket)).toBe('11 pallets in, 7 refused');
	});
});
