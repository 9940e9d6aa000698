import { z } from 'zod';
import { choice } from './list';

/** What an entry is about, by the first part of its type. */
export const auditSubjects = [
	'any',
	'account',
	'session',
	'link',
	'site',
	'partner',
	'contact',
	'product',
	'spec',
	'logger',
	'lane',
	'shipment',
	'arrival',
	'pulp',
	'photo',
	'note',
	'read',
	'trim',
	'clock',
	'assessment',
	'hold',
	'disposition',
	'report',
	'notice',
	'answer',
	'claim',
	'evidence',
	'certificate',
	'settings',
	'act',
	'retention',
	'copy',
	'record'
] as const;
export type AuditSubject = (typeof auditSubjects)[number];

const day = z.union([z.literal(''), z.iso.date()]).catch('');

export const auditQuery = z.object({
	about: choice(auditSubjects),
	by: z.union([z.literal(''), z.literal('system'), z.uuid()]).catch(''),
	from: day,
	to: day,
	docket: z.string().trim().toUpperCase().max(24).catch(''),
	page: z.coerce.number().int().min(1).max(100_000).catch(1)
});
export type AuditQuery = z.output<typeof auditQuery>;
