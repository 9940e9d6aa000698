import { describe, expect, it } from 'vitest';
import { auditSubjects } from '../../schemas/audit-list';
import { auditDetails, auditSubjectWords, auditText } from './audit-events';

describe('an audit entry in words', () => {
	it('says what happened, also to a docket and to what it does not know', () => {
		expect(auditText('account.switched-off', '{}')).toBe('Account switched off');
		expect(auditText('hold.put', '{"reason":"x"}')).toBe('Put on hold');
		expect(auditText('lane.saved', '{}')).toBe('Lane saved');
		expect(auditText('crane.saved', null)).toBe('crane saved');
	});

	it('names every subject its filter offers', () => {
		expect(auditSubjects.filter((subject) => !auditSubjectWords[subject])).toEqual([]);
	});

	it('shows of a change only what differs, with both states', () => {
		const payload = JSON.stringify({
			loggerId: 'l1',
			before: { serial: 'A', calibrationDueOn: null, isInUse: true },
			after: { serial: 'A', calibrationDueOn: '2027-03-01', isInUse: false }
		});
		expect(auditDetails(payload)).toEqual([
			{ label: 'logger id', value: 'l1' },
			{ label: 'calibration due on', value: 'none → 2027-03-01' },
			{ label: 'is in use', value: 'yes → no' }
		]);
	});

	it('shows all of what is new, lists and nested facts in one line, and nothing of a blanked entry', () => {
		const payload = JSON.stringify({
			before: null,
			after: { roles: ['qa', 'dock'], opening: { mon: ['04:00', '15:00'] } }
		});
		expect(auditDetails(payload)).toEqual([
			{ label: 'roles', value: 'qa, dock' },
			{ label: 'opening', value: 'mon 04:00, 15:00' }
		]);
		expect(auditDetails(null)).toEqual([]);
		expect(auditDetails('"text"')).toEqual([]);
	});
});
