import { recordText } from '../../messages/en/record';
import type { DocketView } from '../../schemas/docket';
import { AuditEntry } from '../db/models/audit-entry';
import { AuditPayload } from '../db/models/audit-payload';
import { Contact } from '../db/models/contact';
import { User } from '../db/models/user';

const shown = 60;

/** What happened to a docket, oldest first, from its audit chain. */
export async function recordViews(shipmentId: string): Promise<DocketView['record']> {
	const entries = await AuditEntry.findAll({
		where: { chainId: shipmentId },
		order: [['seq', 'DESC']],
		limit: shown
	});
	const actorIds = [...new Set(entries.map((entry) => entry.actorId).filter((id) => id !== null))];
	const [payloads, users, contacts] = await Promise.all([
		AuditPayload.findAll({ where: { entryId: entries.map((entry) => entry.id) } }),
		User.findAll({ where: { id: actorIds }, attributes: ['id', 'name'] }),
		Contact.findAll({ where: { id: actorIds }, attributes: ['id', 'name'] })
	]);
	const names = new Map([...users, ...contacts].map((person) => [person.id, person.name]));
	const texts = new Map(payloads.map((payload) => [payload.entryId, payload.text]));
	return entries.reverse().map((entry) => ({
		at: entry.occurredAt.toISOString(),
		text: recordText(entry.type, texts.get(entry.id) ?? null),
		by: entry.actorId ? (names.get(entry.actorId) ?? '') : ''
	}));
}
