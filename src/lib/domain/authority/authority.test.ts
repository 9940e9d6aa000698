import { describe, expect, it } from 'vitest';
import {
	secondSignatureReason,
	signingNeeds,
	type DecidedLine,
	type SecondSignatureRules,
	type SigningFacts
} from './authority';

const line: DecidedLine = Object.freeze({
	ordinal: 1,
	outcome: 'accept',
	recommended: 'accept',
	grades: Object.freeze(['inform', 'note'] as const),
	isOverStop: false,
	dockMayAccept: true,
	valueMinor: 500_000,
	currency: 'EUR',
	severities: Object.freeze(['minor'])
});
const noRules: SecondSignatureRules = { fromValue: null, fromSeverity: null };
const qa = { id: 'qa', mayDecide: true, mayAcceptAtDock: false };
const dock = { id: 'dock', mayDecide: false, mayAcceptAtDock: true };

function needs(changes: Partial<SigningFacts>): unknown[] {
	return signingNeeds({
		signer: qa,
		lines: [line],
		corrections: [],
		rules: noRules,
		reviewerIds: [],
		hasDetermination: false,
		...changes
	});
}

// The table itself is the house's own rule; common practice, no source.
describe('the authority table', () => {
	it('lets the dock accept what no finding holds and the product permits', () => {
		expect(needs({ signer: dock })).toEqual([]);
	});

	it.each([
		['conditions', { outcome: 'conditions' }, 'not-accept'],
		['a refusal', { outcome: 'reject' }, 'not-accept'],
		['a product the dock may not accept', { dockMayAccept: false }, 'product'],
		['a line nothing is recommended for', { recommended: null }, 'not-known'],
		['a finding that holds', { grades: ['note', 'hold'] }, 'finding'],
		['a finding that rejects', { grades: ['reject'], recommended: 'reject' }, 'finding'],
		['a recommended hold', { recommended: 'hold' }, 'finding'],
		['a stop', { isOverStop: true }, 'finding']
	] as const)('leaves %s to QA', (_what, changes, why) => {
		expect(needs({ signer: dock, lines: [line, { ...line, ordinal: 2, ...changes }] })).toContainEqual({
			code: 'qa-decides',
			why,
			line: 2
		});
		const ofQa = needs({ lines: [{ ...line, ...changes }], hasDetermination: true });
		expect(ofQa).toEqual([]);
	});

	it('lets nobody else decide', () => {
		const other = { id: 'x', mayDecide: false, mayAcceptAtDock: false };
		expect(needs({ signer: other })).toEqual([{ code: 'qa-decides', why: 'role', line: 1 }]);
	});

	it('asks for another person where the signer’s own correction moved the recommendation', () => {
		const corrections = [{ kind: 'trim' as const, madeById: 'qa', madeBy: 'Ruth' }];
		expect(needs({ corrections })).toEqual([{ code: 'another-person', kind: 'trim', madeBy: 'Ruth' }]);
		expect(needs({ corrections, reviewerIds: ['qa'] })).toHaveLength(1);
		expect(needs({ corrections, reviewerIds: ['qa-2'] })).toEqual([]);
		expect(needs({ corrections, signer: { ...qa, id: 'qa-2' } })).toEqual([]);
	});

	it('takes goods over a stop only on a written determination; refusing them needs none', () => {
		const over = [
			{ ...line, isOverStop: true },
			{ ...line, ordinal: 2 }
		];
		expect(needs({ lines: over })).toEqual([{ code: 'determination', lines: [1] }]);
		expect(needs({ lines: over, hasDetermination: true })).toEqual([]);
		expect(needs({ lines: [{ ...line, isOverStop: true, outcome: 'reject' }] })).toEqual([]);
	});

	it('asks for a second signature from a value or a severity on, and is content with one by another', () => {
		const byValue = { ...noRules, fromValue: { minor: 1_000_000, currency: 'EUR' } };
		expect(needs({ rules: byValue })).toEqual([]);
		const two = [line, { ...line, ordinal: 2 }];
		expect(needs({ rules: byValue, lines: two })).toEqual([{ code: 'second-signature', why: 'value' }]);
		expect(needs({ rules: byValue, lines: two, reviewerIds: ['qa'] })).toHaveLength(1);
		expect(needs({ rules: byValue, lines: two, reviewerIds: ['qa-2'] })).toEqual([]);
	});
});

describe('the rule for a second signature', () => {
	it('adds values of its own currency only', () => {
		const rules = { ...noRules, fromValue: { minor: 600_000, currency: 'USD' } };
		const usd = { ...line, currency: 'USD' };
		expect(secondSignatureReason([line, line], rules)).toBeNull();
		expect(secondSignatureReason([usd, line], rules)).toBeNull();
		expect(secondSignatureReason([usd, usd], rules)).toBe('value');
		expect(secondSignatureReason([{ ...usd, valueMinor: null }], rules)).toBeNull();
	});

	it('counts a severity and everything graver', () => {
		const rules = { ...noRules, fromSeverity: 'major' as const };
		expect(secondSignatureReason([line], rules)).toBeNull();
		expect(secondSignatureReason([{ ...line, severities: ['major'] }], rules)).toBe('severity');
		expect(secondSignatureReason([{ ...line, severities: ['minor', 'critical'] }], rules)).toBe('severity');
	});
});
