import { describe, expect, it } from 'vitest';
import { systemContext, type Actor, type Role } from '../context';
import { nextAct } from './next-act';

const actor = (role: Role): Actor => ({ ...systemContext(new Date(0)).actor, id: 'u', roles: [role] });
const none = { due: 0, kept: 0, questions: 0 };
const load = { number: 'PS-26-0001', stage: 'at-the-door', questionIds: [], isAskedOfQa: false } as const;

describe('what is next with a load', () => {
	it.each([
		['dock', { due: 1, kept: 0, questions: 0 }, 'upload', true],
		['dock', { due: 1, kept: 1, questions: 0 }, 'open', false],
		['dock', none, 'upload', true],
		['qa', { due: 1, kept: 0, questions: 0 }, 'upload', false],
		['qa', { due: 1, kept: 1, questions: 0 }, 'sign', true],
		['qa', none, 'review', true],
		['claims', { due: 1, kept: 1, questions: 0 }, 'open', false]
	] as const)('%s at the door with %o: %s, own: %s', (role, reads, act, isMine) => {
		expect(nextAct(actor(role), { ...load, reads })).toMatchObject({ act, isMine });
	});

	it('goes to the one open question, or to all of them', () => {
		const reads = { due: 2, kept: 0, questions: 1 };
		const one = nextAct(actor('dock'), { ...load, reads, questionIds: ['q1'] });
		expect(one).toMatchObject({ act: 'answer', href: '/shipments/PS-26-0001/reads/q1' });
		const two = nextAct(actor('dock'), { ...load, reads, questionIds: ['q1', 'q2'] });
		expect(two.href).toBe('/shipments/PS-26-0001/reads');
	});

	it('is QA’s where the dock has asked QA', () => {
		const reads = { due: 1, kept: 0, questions: 1 };
		const asked = { ...load, reads, questionIds: ['q1'], isAskedOfQa: true };
		expect(nextAct(actor('qa'), asked).isMine).toBe(true);
		expect(nextAct(actor('qa'), { ...asked, isAskedOfQa: false }).isMine).toBe(false);
	});

	it('offers an arrival only to those who log one', () => {
		const expected = { ...load, stage: 'expected', reads: none } as const;
		expect(nextAct(actor('dock'), expected).act).toBe('log-arrival');
		expect(nextAct(actor('claims'), expected).act).toBe('open');
	});
});
