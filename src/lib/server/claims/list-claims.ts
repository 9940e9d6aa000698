import { QueryTypes } from 'sequelize';
import { rowsPerPage } from '../../schemas/list';
import type { ClaimListQuery, ClaimRow, ClaimStatus } from '../../schemas/claim';
import type { Verdict } from '../../schemas/docket';
import type { Context } from '../context';
import { database } from '../db/sequelize';
import { authorize } from '../policies';

interface Row {
	shipmentId: string;
	docketNumber: string;
	title: string;
	supplier: string;
	carrier: string | null;
	siteName: string;
	zone: string;
	siteCurrency: string;
	decidedAt: Date | null;
	verdict: Verdict | null;
	casesRefused: number | string | null;
	casesShort: number | string | null;
	valueMinor: number | string | null;
	lineCurrency: string | null;
	claimId: string | null;
	claimNumber: string | null;
	status: ClaimStatus | null;
	amountMinor: number | string | null;
	claimCurrency: string | null;
	total: number | string;
}

const order: Record<ClaimListQuery['sort'], string> = {
	opened: 'COALESCE(s.decided_at, s.arrived_at)',
	docket: 's.number',
	amount: 'COALESCE(c.amount_minor, l.value_minor)'
};

const shown: Record<ClaimListQuery['show'], string> = {
	all: '1 = 1',
	unclaimed: 'c.id IS NULL',
	running: "c.status IN ('open', 'noticed', 'filed')",
	ended: "c.status IN ('settled', 'declined', 'closed')"
};

/** Refused or short dockets of the actor's sites, each with its claim where there is one. */
export async function listClaims(
	ctx: Context,
	query: ClaimListQuery
): Promise<{ items: ClaimRow[]; total: number }> {
	authorize(ctx, 'claim.view');
	if (ctx.actor.siteIds.length === 0) return { items: [], total: 0 };
	const rows = await database().query<Row>(
		`SELECT s.id AS shipmentId, s.number AS docketNumber, s.title, p.name AS supplier, k.name AS carrier, t.name AS siteName,
			t.zone, t.currency AS siteCurrency, s.decided_at AS decidedAt, s.verdict, r.cases AS casesRefused, l.short AS casesShort,
			l.value_minor AS valueMinor, l.currency AS lineCurrency, c.id AS claimId, c.number AS claimNumber, c.status,
			c.amount_minor AS amountMinor, c.currency AS claimCurrency, COUNT(*) OVER () AS total
		 FROM shipments s JOIN partners p ON p.id = s.supplier_id LEFT JOIN partners k ON k.id = s.carrier_id
		 JOIN sites t ON t.id = s.site_id LEFT JOIN claims c ON c.shipment_id = s.id
		 LEFT JOIN (SELECT shipment_id, SUM(GREATEST(0, cases_advised - COALESCE(cases_received, cases_advised))) AS short,
			SUM(value_minor) AS value_minor, MIN(currency) AS currency FROM shipment_lines GROUP BY shipment_id) l ON l.shipment_id = s.id
		 LEFT JOIN (SELECT d.shipment_id, SUM(o.cases) AS cases FROM disposition_lines o JOIN dispositions d ON d.id = o.disposition_id
			WHERE o.outcome = 'reject' AND d.version = (SELECT MAX(n.version) FROM dispositions n WHERE n.shipment_id = d.shipment_id)
			GROUP BY d.shipment_id) r ON r.shipment_id = s.id
		 WHERE s.site_id IN (:siteIds) AND s.cancelled_at IS NULL AND (c.id IS NOT NULL OR r.cases > 0 OR (l.short > 0 AND s.arrived_at IS NOT NULL))
			AND (${shown[query.show]})
			AND (:q = '' OR CONCAT_WS(' ', s.number, s.title, p.name, k.name, c.number) LIKE :like)
		 ORDER BY ${order[query.sort]} ${query.dir === 'asc' ? 'DESC' : 'ASC'}, s.number DESC LIMIT :limit OFFSET :offset`,
		{
			type: QueryTypes.SELECT,
			replacements: {
				siteIds: [...ctx.actor.siteIds],
				q: query.q,
				like: `%${query.q.replace(/[\\%_]/g, '\\$&')}%`,
				limit: rowsPerPage,
				offset: (query.page - 1) * rowsPerPage
			}
		}
	);
	return { items: rows.map(claimRow), total: Number(rows[0]?.total ?? 0) };
}

const numberOrNull = (value: number | string | null) => (value === null ? null : Number(value));

function claimRow(row: Row): ClaimRow {
	const { shipmentId, docketNumber, title, supplier, carrier, siteName, zone, verdict } = row;
	return {
		shipmentId,
		docketNumber,
		title,
		supplier,
		carrier,
		siteName,
		zone,
		verdict,
		decidedAt: row.decidedAt?.toISOString() ?? null,
		casesRefused: Number(row.casesRefused ?? 0),
		casesShort: Number(row.casesShort ?? 0),
		valueMinor: numberOrNull(row.valueMinor),
		currency: row.lineCurrency ?? row.siteCurrency,
		claim:
			row.claimId && row.claimNumber && row.status
				? {
						id: row.claimId,
						number: row.claimNumber,
						status: row.status,
						amountMinor: numberOrNull(row.amountMinor),
						currency: row.claimCurrency ?? row.siteCurrency
					}
				: null
	};
}
