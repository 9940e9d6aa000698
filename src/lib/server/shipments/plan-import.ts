import { Op } from 'sequelize';
import type { ImportFault } from '../../schemas/import';
import { shipmentInput, type ShipmentInput } from '../../schemas/shipment-form';
import { Partner } from '../db/models/partner';
import { Product } from '../db/models/product';
import { Shipment } from '../db/models/shipment';
import type { Site } from '../db/models/site';
import { InvalidFields } from './invalid-fields';
import { preparePapers } from './prepare-papers';
import type { NoticeRow } from './read-notices';

/** A load of the file: ready to be opened where it has no faults and is not known. */
export interface PlannedLoad {
	name: string;
	rows: NoticeRow[];
	input: ShipmentInput | null;
	faults: ImportFault[];
	knownAs: string | null;
}

/** Which column of the file a field of the papers comes from. */
const columnOf: Record<string, string> = {
	supplierId: 'supplier',
	carrierId: 'carrier',
	purchaseOrder: 'order',
	billOfLading: 'waybill',
	vehicle: 'trailer',
	productId: 'product',
	bestBeforeOn: 'best before',
	openingHours: 'used hours',
	openingBasis: 'used basis',
	planned: 'loaded',
	setPointCelsius: 'setpoint',
	serial: 'loggers'
};

/** Columns that speak of the whole load: every row of it must say the same, or nothing. */
const loadColumns = [
	...([
		'supplier',
		'carrier',
		'order',
		'waybill',
		'mode',
		'trailer',
		'seal',
		'dock',
		'due',
		'loaded'
	] as const),
	'setpoint'
] as const;

interface Names {
	suppliers: Map<string, string>;
	carriers: Map<string, string>;
	products: Map<string, string>;
}

function keyed(rows: readonly { id: string; name: string; gln?: string | null }[]): Map<string, string> {
	return new Map(
		rows.flatMap(({ id, name, gln }) => [[name.toLowerCase(), id], ...(gln ? [[gln, id] as const] : [])]) as [
			string,
			string
		][]
	);
}

/** The partners and products that a file can name. */
export async function findNames(): Promise<Names> {
	const partners = await Partner.findAll({ where: { switchedOffAt: null } });
	return {
		suppliers: keyed(partners.filter((partner) => partner.isSupplier)),
		carriers: keyed(partners.filter((partner) => partner.isCarrier)),
		products: keyed(await Product.findAll({ where: { switchedOffAt: null } }))
	};
}

/** What the load's own columns say, and where its rows contradict each other. */
function saidOfLoad(rows: readonly NoticeRow[], faults: ImportFault[]) {
	return Object.fromEntries(
		loadColumns.map((column) => {
			const first = rows.find(({ cells }) => cells[column])?.cells[column] ?? '';
			for (const { row, cells } of rows)
				if (cells[column] && cells[column] !== first)
					faults.push({
						row,
						column,
						text: `“${cells[column]}” here, “${first}” above: one load, one ${column}.`
					});
			return [column, first];
		})
	) as Record<(typeof loadColumns)[number], string>;
}

function idOf(names: Map<string, string>, name: string): string {
	return names.get(name.toLowerCase()) ?? '';
}

function lineOf({ cells }: NoticeRow, names: Names) {
	return {
		productId: idOf(names.products, cells.product ?? ''),
		...{ lot: cells.lot, gtin: cells.gtin, cases: cells.cases, pallets: cells.pallets },
		...{ value: cells.value, currency: cells.currency, bestBeforeOn: cells['best before'] },
		ssccs: (cells.ssccs ?? '').split(/[\s,]+/),
		openingKind: cells['used hours'] ? 'declared' : 'undeclared',
		openingHours: cells['used hours'],
		openingBasis: cells['used basis']
	};
}

/** The papers as the form would send them: the same schema and checks then judge both. */
function formOf(rows: readonly NoticeRow[], names: Names, faults: ImportFault[]) {
	const said = saidOfLoad(rows, faults);
	const carrierId = idOf(names.carriers, said.carrier);
	const unknown = (column: string, what: string, row = rows[0]?.row ?? 0) =>
		faults.push({ row, column, text: `There is no ${what}. Write it as it stands in Wharfinger.` });
	if (said.supplier && !idOf(names.suppliers, said.supplier))
		unknown('supplier', `supplier “${said.supplier}”`);
	if (said.carrier && !carrierId) unknown('carrier', `carrier “${said.carrier}”`);
	for (const { row, cells } of rows)
		if (cells.product && !idOf(names.products, cells.product))
			unknown('product', `product “${cells.product}”`, row);
	if (!said.order && !said.waybill)
		faults.push({ row: rows[0]?.row ?? 0, column: 'order', text: 'Name the order or the waybill.' });
	const hasCarrierLeg = Boolean(said.carrier && said.loaded);
	return {
		...{ supplierId: idOf(names.suppliers, said.supplier), carrierId, purchaseOrder: said.order },
		...{ billOfLading: said.waybill, mode: said.mode.toLowerCase() || 'road', vehicle: said.trailer },
		...{ seal: said.seal, dock: said.dock, due: said.due },
		lines: rows.map((row) => lineOf(row, names)),
		handovers: hasCarrierLeg
			? [
					{
						partnerId: carrierId,
						planned: said.loaded,
						setPointCelsius: said.setpoint,
						source: 'advance notice'
					}
				]
			: [],
		loggers: rows.flatMap(({ cells }, at) =>
			(cells.loggers ?? '')
				.split(/[\s,]+/)
				.filter(Boolean)
				.map((serial) => ({ serial, line: at + 1 }))
		)
	};
}

/** A fault of the papers, told by the file's row and column. A cell that was already called unknown is not told twice. */
function faultAt(path: string, text: string, rows: readonly NoticeRow[]): ImportFault {
	const parts = path.split('.');
	const isLine = parts[0] === 'lines' && parts[1] !== undefined;
	const row = (isLine ? rows[Number(parts[1])] : rows[0])?.row ?? 0;
	const field = parts.at(-1) ?? path;
	return { row, column: columnOf[field] ?? field, text };
}

async function judge(site: Site, form: unknown, rows: readonly NoticeRow[], faults: ImportFault[]) {
	const add = (path: string, text: string) => {
		const fault = faultAt(path, text, rows);
		if (!faults.some(({ row, column }) => row === fault.row && column === fault.column)) faults.push(fault);
	};
	const parsed = shipmentInput.safeParse(form);
	if (!parsed.success) {
		for (const issue of parsed.error.issues) add(issue.path.join('.'), issue.message);
		return null;
	}
	try {
		await preparePapers(site, parsed.data);
	} catch (error) {
		if (!(error instanceof InvalidFields)) throw error;
		for (const [path, text] of Object.entries(error.issues)) add(path, text);
	}
	return faults.length === 0 ? parsed.data : null;
}

/** The docket that the same supplier's same papers have opened. */
async function findKnown(site: Site, input: ShipmentInput): Promise<string | null> {
	const { supplierId, purchaseOrder, billOfLading } = input;
	const known = await Shipment.findOne({
		where: { siteId: site.id, supplierId, purchaseOrder, billOfLading, cancelledAt: { [Op.is]: null } }
	});
	return known?.number ?? null;
}

/** Works out what a file would open, load by load, and writes nothing. */
export async function planImport(site: Site, rows: readonly NoticeRow[]): Promise<PlannedLoad[]> {
	const names = await findNames();
	const groups = new Map<string, NoticeRow[]>();
	for (const row of rows) {
		const name = row.cells.load?.trim() || `row ${row.row}`;
		groups.set(name, [...(groups.get(name) ?? []), row]);
	}
	const planned: PlannedLoad[] = [];
	const papers = new Map<string, string>();
	for (const [name, own] of groups) {
		const faults: ImportFault[] = [];
		const input = await judge(site, formOf(own, names, faults), own, faults);
		const knownAs = input ? await findKnown(site, input) : null;
		const key = input && [input.supplierId, input.purchaseOrder, input.billOfLading].join('\n');
		const twin = key === null ? undefined : papers.get(key);
		if (twin !== undefined)
			faults.push({
				row: own[0]?.row ?? 0,
				column: 'order',
				text: `These papers are those of ${twin} above.`
			});
		else if (key !== null) papers.set(key, name);
		planned.push({ name, rows: own, input: twin === undefined ? input : null, faults, knownAs });
	}
	return planned;
}
