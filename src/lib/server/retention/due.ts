import { QueryTypes, type Transaction } from 'sequelize';
import type { RetentionPeriods, RetentionRule } from '../../schemas/retention';
import { database } from '../db/sequelize';
import { personalEvents } from './personal-events';

/** A docket is held while somebody says so, while a claim on it is open, and for a time after. Shared by every question. */
const isHeld = `(EXISTS (SELECT 1 FROM retention_holds h WHERE h.shipment_id = s.id AND h.lifted_at IS NULL)
	OR EXISTS (SELECT 1 FROM claims c WHERE c.shipment_id = s.id
		AND (c.closed_at IS NULL OR c.closed_at + INTERVAL :claims MONTH > :now)))`;

/** A docket's periods begin with its last decision, else with its cancellation; an open docket's have not begun. */
const beganAt = `COALESCE(
	(SELECT MAX(d.signed_at) FROM dispositions d WHERE d.shipment_id = s.id), s.decided_at, s.cancelled_at)`;

export interface DueFile {
	fileId: string;
	sha256: string;
	bytes: number;
	shipmentId: string;
	docket: string;
	what: string;
	rule: RetentionRule;
	dueAt: Date;
	isHeld: boolean;
}

interface Until {
	periods: RetentionPeriods;
	now: Date;
	/** Everything that falls due before this. */
	before: Date;
	/** Of this file only. */
	fileId?: string;
}

/** Uploads of dockets; a file that serves several dockets is named once for each. */
const uploads = `
	SELECT r.file_id, r.shipment_id, r.file_name AS what, r.uploaded_at,
		IF(r.state IN ('refused', 'withdrawn'), 'refused-uploads', 'uploads') AS rule FROM logger_reads r
	UNION ALL SELECT p.file_id, p.shipment_id, CONCAT('photograph, ', p.kind), p.taken_at, 'uploads' FROM photos p
	UNION ALL SELECT nf.file_id, n.shipment_id, 'file of a note', n.written_at, 'uploads'
		FROM note_files nf JOIN notes n ON n.id = nf.note_id
	UNION ALL SELECT a.driver_signature_id, a.shipment_id, 'signature of the driver', a.logged_at, 'people'
		FROM arrivals a WHERE a.driver_signature_id IS NOT NULL
	UNION ALL SELECT na.file_id, n.shipment_id, 'file of an answer', na.answered_at, 'uploads'
		FROM notice_answers na JOIN notices n ON n.id = na.notice_id WHERE na.file_id IS NOT NULL
	UNION ALL SELECT cf.file_id, c.shipment_id, 'paper of a claim', cf.attached_at, 'uploads'
		FROM claim_files cf JOIN claims c ON c.id = cf.claim_id`;

/** Uploads whose period ends before an instant, soonest first, held ones too. */
export async function dueFiles(
	{ periods, now, before, fileId }: Until,
	transaction?: Transaction
): Promise<DueFile[]> {
	const rows = await database().query<Omit<DueFile, 'isHeld'> & { isHeld: number }>(
		`SELECT * FROM (SELECT f.id AS fileId, f.sha256, f.bytes, s.id AS shipmentId, s.number AS docket, u.what, u.rule,
			CASE u.rule WHEN 'uploads' THEN ${beganAt} + INTERVAL :uploads MONTH
				WHEN 'people' THEN ${beganAt} + INTERVAL :people MONTH
				ELSE u.uploaded_at + INTERVAL :refused MONTH END AS dueAt,
			${isHeld} AS isHeld
		FROM (${uploads}) u JOIN files f ON f.id = u.file_id AND f.deleted_at IS NULL JOIN shipments s ON s.id = u.shipment_id
		${fileId ? 'WHERE f.id = :fileId' : ''}) due WHERE dueAt < :before ORDER BY dueAt, docket, what`,
		{
			replacements: { ...periods, refused: periods['refused-uploads'], now, before, fileId },
			type: QueryTypes.SELECT,
			transaction
		}
	);
	return rows.map((row) => ({
		...row,
		bytes: Number(row.bytes),
		dueAt: new Date(row.dueAt),
		isHeld: Boolean(Number(row.isHeld))
	}));
}

export interface DueChain {
	chainId: string;
	scope: 'shipment' | 'site' | 'account' | 'organisation';
	docket: string | null;
	entries: number;
	/** When the first of them falls due. */
	dueAt: Date;
	isHeld: boolean;
}

const entryDueAt = `IF(c.scope = 'shipment', ${beganAt}, e.occurred_at) + INTERVAL :people MONTH`;

const personalEntries = `FROM audit_entries e
	JOIN audit_chains c ON c.id = e.chain_id
	JOIN audit_payloads p ON p.entry_id = e.id AND p.text IS NOT NULL
	LEFT JOIN shipments s ON c.scope = 'shipment' AND s.id = c.id
	WHERE e.type IN (:personal) AND ${entryDueAt} < :before`;

/** Chains with personal payloads whose period ends before an instant, soonest first, held ones too. */
export async function dueChains({ periods, now, before }: Until): Promise<DueChain[]> {
	const rows = await database().query<Omit<DueChain, 'isHeld'> & { isHeld: number }>(
		`SELECT c.id AS chainId, c.scope, s.number AS docket, COUNT(*) AS entries, MIN(${entryDueAt}) AS dueAt,
			MAX(s.id IS NOT NULL AND ${isHeld}) AS isHeld
		${personalEntries} GROUP BY c.id, c.scope, s.number ORDER BY dueAt, docket`,
		{ replacements: { ...periods, now, before, personal: personalEvents }, type: QueryTypes.SELECT }
	);
	return rows.map((row) => ({
		...row,
		entries: Number(row.entries),
		dueAt: new Date(row.dueAt),
		isHeld: Boolean(Number(row.isHeld))
	}));
}

/** The entries of one chain to blank now, with their numbers and kinds. */
export async function dueEntries(
	chainId: string,
	{ periods, now, before }: Until,
	transaction: Transaction
): Promise<{ id: string; seq: number; type: string }[]> {
	return database().query<{ id: string; seq: number; type: string }>(
		`SELECT e.id, e.seq, e.type ${personalEntries} AND e.chain_id = :chainId
			AND NOT (s.id IS NOT NULL AND ${isHeld}) ORDER BY e.seq`,
		{
			replacements: { ...periods, now, before, chainId, personal: personalEvents },
			type: QueryTypes.SELECT,
			transaction
		}
	);
}

export interface DueDocket {
	shipmentId: string;
	docket: string;
	dueAt: Date;
	isHeld: boolean;
}

/** Dockets whose period for people ends before an instant, soonest first, held ones too. */
export async function dueDockets(
	{ periods, now, before }: Until,
	transaction?: Transaction
): Promise<DueDocket[]> {
	const rows = await database().query<Omit<DueDocket, 'isHeld'> & { isHeld: number }>(
		`SELECT * FROM (SELECT s.id AS shipmentId, s.number AS docket, ${beganAt} + INTERVAL :people MONTH AS dueAt,
			${isHeld} AS isHeld FROM shipments s) due WHERE dueAt < :before ORDER BY dueAt, docket`,
		{ replacements: { ...periods, now, before }, type: QueryTypes.SELECT, transaction }
	);
	return rows.map((row) => ({ ...row, dueAt: new Date(row.dueAt), isHeld: Boolean(Number(row.isHeld)) }));
}
