import { recordText } from './record';

/** What each subject of the trail is called in its filter. */
export const auditSubjectWords: Record<string, string> = {
	any: 'Everything',
	account: 'Accounts',
	session: 'Sign-ins',
	link: 'Mailed links',
	site: 'Sites',
	partner: 'Partners',
	contact: 'Contacts',
	product: 'Products',
	spec: 'Specs',
	logger: 'Loggers',
	lane: 'Lanes',
	shipment: 'Dockets',
	arrival: 'Arrivals',
	pulp: 'Pulp readings',
	photo: 'Photographs',
	note: 'Notes',
	read: 'Reads',
	trim: 'Trims',
	clock: 'Clocks of loggers',
	assessment: 'Assessments',
	hold: 'Holds',
	disposition: 'Dispositions',
	report: 'Reports',
	notice: 'Notices',
	answer: 'Answers',
	claim: 'Claims',
	evidence: 'Evidence bundles',
	certificate: 'Certificates',
	settings: 'Settings',
	act: 'Refused acts',
	retention: 'Retention',
	copy: 'Copies',
	record: 'Exports of the record'
};

const sentences: Record<string, string> = {
	'account.invited': 'Invited',
	'account.changed': 'Account changed',
	'account.switched-off': 'Account switched off',
	'account.switched-on': 'Account switched on',
	'account.password-set': 'Password set',
	'account.locked': 'Account locked',
	'account.unlocked': 'Account unlocked',
	'account.token-made': 'API token made',
	'account.token-revoked': 'API token revoked',
	'account.second-factor': 'Second factor changed',
	'session.opened': 'Signed in',
	'session.refused': 'Sign-in refused',
	'site.saved': 'Site saved',
	'partner.saved': 'Partner saved',
	'contact.saved': 'Contact saved',
	'product.saved': 'Product saved',
	'spec.drafted': 'Spec drafted',
	'spec.signed': 'Spec signed',
	'logger.saved': 'Logger saved',
	'lane.saved': 'Lane saved',
	'certificate.made': 'Certificate made',
	'certificate.replaced': 'Certificate replaced',
	'certificate.ending': 'Admins told that the certificate ends',
	'settings.changed': 'Settings changed',
	'act.refused': 'Act refused',
	'record.exported': 'Record exported'
};

/** What happened, in a few words; docket events say it as the docket's own record does. */
export function auditText(type: string, payload: string | null): string {
	return sentences[type] ?? recordText(type, payload);
}

/** `calibrationDueOn` as "calibration due on". */
function plain(name: string): string {
	return name.replace(/([a-z0-9])([A-Z])/g, '$1 $2').toLowerCase();
}

function shown(value: unknown): string {
	if (value === null || value === undefined || value === '') return 'none';
	if (typeof value === 'boolean') return value ? 'yes' : 'no';
	if (Array.isArray(value)) return value.length === 0 ? 'none' : value.map(shown).join(', ');
	if (typeof value === 'object')
		return Object.entries(value)
			.map(([name, inner]) => `${plain(name)} ${shown(inner)}`)
			.join('; ');
	return String(value);
}

export interface AuditDetail {
	label: string;
	value: string;
}

function isFields(value: unknown): value is Record<string, unknown> {
	return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** What an entry holds, a row a fact; of a change only what differs, as "from → to". Empty once it was blanked. */
export function auditDetails(payload: string | null): AuditDetail[] {
	const data: unknown = payload === null ? null : JSON.parse(payload);
	if (!isFields(data)) return [];
	const { before, after, ...rest } = data;
	const facts = Object.entries(rest).map(([name, value]) => ({ label: plain(name), value: shown(value) }));
	if (!isFields(after)) return facts;
	const was = isFields(before) ? before : null;
	const changes = Object.entries(after)
		.filter(([name, value]) => !was || JSON.stringify(was[name]) !== JSON.stringify(value))
		.map(([name, value]) => ({
			label: plain(name),
			value: was ? `${shown(was[name])} → ${shown(value)}` : shown(value)
		}));
	return [...facts, ...changes];
}
