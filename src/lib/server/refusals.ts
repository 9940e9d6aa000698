/** One table: the codes, their status and the sentence the user reads cannot disagree. */
const refusals = {
	'no-session': { status: 401, message: 'Sign in first.' },
	'not-allowed': { status: 403, message: 'Your role may not do this.' },
	'not-found': { status: 404, message: 'There is no such record, or it is not yours to see.' },
	invalid: { status: 422, message: 'Some of what was sent cannot be used.' },
	'already-signed': { status: 409, message: 'This docket has been signed. Amend it, with a reason.' },
	'not-signed': { status: 409, message: 'This docket has not been signed yet.' },
	'not-arrived': { status: 409, message: 'Log the arrival first; nothing was at the door yet.' },
	'already-arrived': { status: 409, message: 'The arrival of this load has already been logged.' },
	cancelled: { status: 409, message: 'This docket was cancelled. Nothing can be added to it.' },
	'already-on-hold': { status: 409, message: 'This docket is on hold already.' },
	'not-on-hold': { status: 409, message: 'This docket is not on hold.' },
	'changed-meanwhile': {
		status: 409,
		message: 'Somebody changed this docket while you were looking at it. Look again, then sign.'
	},
	'wrong-password': { status: 422, message: 'That is not your password. Nothing was signed.' },
	'not-yet-yours': { status: 409, message: 'Something else is needed before you may sign this.' },
	'code-needed': {
		status: 422,
		message: 'This account has a second factor. Enter the code your authenticator shows now.'
	},
	'wrong-code': {
		status: 422,
		message: 'That code is not the one for now. Look at your authenticator again, and at your phone’s clock.'
	},
	'second-factor-set': { status: 409, message: 'A second factor is set up already.' },
	'last-admin': {
		status: 409,
		message: 'This is the last admin who can sign in. Make somebody else an admin first.'
	},
	'switched-off': {
		status: 403,
		message: 'This account has been switched off. An admin can switch it on again.'
	},
	locked: {
		status: 423,
		message: 'This account is locked after several wrong passwords. An admin can unlock it.'
	},
	'too-many-attempts': {
		status: 429,
		message: 'Too many attempts. Wait a quarter of an hour, then try again.'
	},
	'link-used': { status: 410, message: 'This link has been used or has run out. Ask for a fresh one.' },
	'too-large': {
		status: 413,
		message: 'The file is larger than 50 MB. Export a shorter period and upload that.'
	},
	'not-multipart': { status: 422, message: 'No file came with the upload. Choose a file and send it again.' },
	'upload-broken': { status: 422, message: 'The upload broke off before the file was whole. Send it again.' },
	'file-too-heavy': {
		status: 422,
		message: 'The file took too long or too much memory to read. Export a shorter period and upload that.'
	},
	'already-kept': { status: 409, message: 'This read has been kept already. QA can withdraw it.' },
	'not-understood': {
		status: 409,
		message: 'This file has not been understood yet. Answer its question first.'
	},
	'wrong-type': { status: 422, message: 'This kind of file cannot be used here.' },
	duplicate: { status: 409, message: 'There is one with that name or number already.' },
	'in-use': { status: 409, message: 'It is in use, so it cannot be changed. Make a new version.' },
	'spec-signed': {
		status: 409,
		message: 'This version has been signed and never changes. Save a new draft from it.'
	},
	'file-expired': {
		status: 410,
		message:
			'The bytes of this file were taken out when its retention period ended. Its hash is on the record.'
	},
	'database-away': {
		status: 503,
		message: 'The database does not answer. Nothing was changed. Try again in a minute.'
	}
} as const;

export type RefusalCode = keyof typeof refusals;

/** A request we understood and decline. Anything else that is thrown is a bug. */
export class Refusal extends Error {
	readonly status: number;
	constructor(
		readonly code: RefusalCode,
		/** Says more than the table's sentence, for the same user. */
		detail?: string
	) {
		super(detail ?? refusals[code].message);
		this.name = 'Refusal';
		this.status = refusals[code].status;
	}
}
