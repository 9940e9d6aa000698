import { parse } from 'csv-parse/sync';
import { text } from 'node:stream/consumers';
import { execFileSync } from 'node:child_process';
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { buildShipment, buildSite, buildUser, contextFor } from '../../../../../tests/helpers/factories';
import { useTestDatabase } from '../../../../../tests/helpers/test-database';
import { auditQuery } from '../../../schemas/audit-list';
import type { Role } from '../../context';
import { addNote } from '../../notes/add-note';
import { listAuditEntries } from '../list-entries';
import { recordCsv } from './record-csv';
import { recordDocument } from './record-document';

useTestDatabase();

async function written(notes: number) {
	const site = await buildSite();
	const { shipment } = await buildShipment({ site });
	const person = async (role: Role) => contextFor(await buildUser([role], { sites: [site] }));
	const qa = await person('qa');
	for (let i = 0; i < notes; i++)
		await addNote(qa, shipment.number, {
			id: null,
			text: i === 0 ? '=1+1, "quoted"\nand −4.5' : `note ${i}`
		});
	return { shipment, qa, person, query: auditQuery.parse({ docket: shipment.number }) };
}

describe('the record as CSV', () => {
	it('holds every entry the filter leaves, and a spreadsheet takes no cell for a formula', async () => {
		const { qa, query } = await written(3);
		const { open } = await recordCsv(qa, query, 'UTC');
		const rows: Record<string, string>[] = parse(await text(open()), { columns: true });
		expect(rows).toHaveLength(3);
		expect(rows.map(({ event }) => event)).toEqual(['note.written', 'note.written', 'note.written']);
		const cells = rows.flatMap((row) => Object.values(row));
		expect(cells.filter((cell) => /^[=+@]/.test(cell))).toEqual([]);
		expect(rows.at(-1)?.payload).toContain('=1+1, \\"quoted\\"\\nand −4.5');
		expect(rows[0]?.sha256).toMatch(/^[0-9a-f]{64}$/);
	});

	it('goes on past one batch without losing or doubling an entry', async () => {
		const { qa, query } = await written(510);
		const { open } = await recordCsv(qa, query, 'UTC');
		const rows: Record<string, string>[] = parse(await text(open()), { columns: true });
		expect(new Set(rows.map((row) => row.entry_in_chain)).size).toBe(510);
		expect(rows).toHaveLength(510);
	});

	it('is for QA and admins, and is itself written down', async () => {
		const { person, query, qa } = await written(1);
		for (const role of ['dock', 'claims'] as const)
			await expect(recordCsv(await person(role), query, 'UTC')).rejects.toMatchObject({
				code: 'not-allowed'
			});
		await recordCsv(qa, query, 'UTC');
		const { items } = await listAuditEntries(qa, auditQuery.parse({ about: 'record' }), 'UTC');
		expect(JSON.parse(items[0]?.payload ?? '{}')).toMatchObject({
			as: 'csv',
			entries: 1,
			filter: { docket: query.docket }
		});
	});
});

describe('the record as PDF', () => {
	it('prints every entry with who and when, and is sound', async () => {
		const { qa, query } = await written(60);
		const { items } = await listAuditEntries(qa, query, 'UTC');
		const order = { entries: items, query, zone: 'Europe/Amsterdam', organisation: 'Pell Staithe' };
		const pdf = await recordDocument({ ...order, madeAt: qa.now.toISOString(), madeBy: qa.actor.name });
		const file = join(mkdtempSync(join(tmpdir(), 'record-')), 'record.pdf');
		writeFileSync(file, pdf);
		execFileSync('qpdf', ['--check', file]);
		const printed = execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' });
		expect(printed.match(/Note written/g)).toHaveLength(items.length);
		expect(printed).toContain(`Taken by ${qa.actor.name}`);
	});
});
