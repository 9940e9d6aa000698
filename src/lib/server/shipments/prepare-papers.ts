import { Op } from 'sequelize';
import { minorUnitDigits } from '../../format';
import { hoursPerDay } from '../../domain/units';
import type { HandoverInput, LineInput, LoggerInput, ShipmentInput } from '../../schemas/shipment-form';
import { Logger } from '../db/models/logger';
import { Partner } from '../db/models/partner';
import { Product } from '../db/models/product';
import type { Site } from '../db/models/site';
import { laneFault } from './lane-fault';
import { refuseFaults } from './invalid-fields';
import { siteTime } from './site-time';

type Issues = Record<string, string>;

/** Everything of the papers in the form the rows keep it, checked against the records. */
export type PreparedPapers = Awaited<ReturnType<typeof preparePapers>>;

interface Known {
	partners: Map<string, Partner>;
	products: Map<string, Product>;
	loggers: Map<string, Logger>;
}

async function findKnown(input: ShipmentInput): Promise<Known> {
	const partnerIds = [
		input.supplierId,
		input.carrierId,
		...input.handovers.map((row) => row.partnerId)
	].filter((id) => id !== null);
	const [partners, products, loggers] = await Promise.all([
		Partner.findAll({ where: { id: { [Op.in]: partnerIds } } }),
		Product.findAll({ where: { id: { [Op.in]: input.lines.map((row) => row.productId) } } }),
		Logger.findAll({ where: { serial: { [Op.in]: input.loggers.map((row) => row.serial) } } })
	]);
	return {
		partners: new Map(partners.map((partner) => [partner.id, partner])),
		products: new Map(products.map((product) => [product.id, product])),
		loggers: new Map(loggers.map((logger) => [logger.serial.toLowerCase(), logger]))
	};
}

function instants(zone: string, issues: Issues) {
	return (typed: string | null, path: string): Date | null => {
		if (typed === null) return null;
		const found = siteTime(typed, zone);
		if (found.ok) return found.at;
		issues[path] = found.fault;
		return null;
	};
}

type InstantOf = ReturnType<typeof instants>;

function prepareLine(row: LineInput, site: Site, known: Known, instantOf: InstantOf, issues: Issues) {
	const product = known.products.get(row.productId);
	if (!product) issues[`lines.${row.at}.productId`] = 'There is no such product.';
	const currency = row.value === null ? null : (row.currency ?? site.currency);
	const pallets = row.pallets ?? row.ssccs.length;
	if (row.ssccs.length > pallets)
		issues[`lines.${row.at}.ssccs`] = `${row.ssccs.length} labels for ${pallets} pallets.`;
	return {
		id: row.id,
		at: row.at,
		productId: row.productId,
		description: row.description ?? product?.name ?? '',
		lot: row.lot,
		gtin: row.gtin,
		ssccs: row.ssccs,
		casesAdvised: row.cases ?? 0,
		palletsAdvised: pallets,
		valueMinor:
			row.value === null || currency === null
				? null
				: Math.round(row.value * 10 ** minorUnitDigits(currency)),
		currency,
		bestBeforeOn: row.bestBeforeOn,
		neededHours: row.neededDays === null ? null : row.neededDays * hoursPerDay,
		compartment: row.compartment,
		openingKind: row.openingKind,
		openingHours: row.openingKind === 'declared' ? row.openingHours : null,
		openingPlusMinusHours: row.openingKind === 'undeclared' ? null : row.openingPlusMinusHours,
		openingSinceAt:
			row.openingKind === 'computed' ? instantOf(row.openingSince, `lines.${row.at}.openingSince`) : null,
		openingCelsius: row.openingKind === 'computed' ? row.openingCelsius : null,
		openingPlusMinusCelsius: row.openingKind === 'computed' ? row.openingPlusMinusCelsius : null,
		openingBasis: row.openingBasis
	};
}

function prepareHandover(row: HandoverInput, known: Known, instantOf: InstantOf, issues: Issues) {
	const partner = row.partnerId === null ? null : known.partners.get(row.partnerId);
	const holder = row.holder ?? partner?.name ?? '';
	if (partner === undefined) issues[`handovers.${row.at}.partnerId`] = 'There is no such partner.';
	else if (holder === '') issues[`handovers.${row.at}.holder`] = 'To whom? Choose a partner or write a name.';
	return {
		id: row.id,
		at: row.at,
		partnerId: row.partnerId,
		holder,
		place: row.place ?? '',
		plannedAt: instantOf(row.planned, `handovers.${row.at}.planned`),
		actualAt: instantOf(row.actual, `handovers.${row.at}.actual`),
		plusMinusMinutes: row.plusMinusMinutes ?? 0,
		source: row.source,
		setPointCelsius: row.setPointCelsius,
		allowedHours: row.allowedHours
	};
}

function checkOrder(
	rows: readonly { at: number; plannedAt: Date | null; actualAt: Date | null }[],
	issues: Issues
): void {
	for (const [kind, field] of [
		['plannedAt', 'planned'],
		['actualAt', 'actual']
	] as const) {
		let latest: Date | null = null;
		for (const row of rows) {
			const at = row[kind];
			if (at === null) continue;
			if (latest !== null && at < latest)
				issues[`handovers.${row.at}.${field}`] ??= 'Earlier than the handover before it.';
			latest = at;
		}
	}
}

interface LinePlace {
	at: number;
	compartment: string | null;
}

function prepareLogger(row: LoggerInput, lines: readonly LinePlace[], known: Known, issues: Issues) {
	const lineAt = row.line === null ? null : row.line - 1;
	const line = lines.find(({ at }) => at === lineAt);
	if (lineAt !== null && !line) issues[`loggers.${row.at}.line`] = `There is no line ${row.line}.`;
	if (line && row.compartment && line.compartment?.toLowerCase() !== row.compartment.toLowerCase())
		issues[`loggers.${row.at}.compartment`] =
			`Line ${row.line} rides ${line.compartment ? `in ${line.compartment}` : 'in no compartment'}.`;
	return {
		id: row.id,
		serial: row.serial,
		loggerId: known.loggers.get(row.serial.toLowerCase())?.id ?? null,
		lineAt,
		compartment: row.compartment,
		position: row.position,
		placement: row.placement
	};
}

function checkSerials(rows: readonly LoggerInput[], issues: Issues): void {
	const seen = new Set<string>();
	for (const row of rows) {
		const serial = row.serial.toLowerCase();
		if (seen.has(serial)) issues[`loggers.${row.at}.serial`] = 'This logger stands there twice.';
		seen.add(serial);
	}
}

/**
 * Checks the papers against the records and turns local times into instants. The lane a docket is on already stays
 * its own, also when it has been switched off since. @throws InvalidFields
 */
export async function preparePapers(site: Site, input: ShipmentInput, ownLaneId: string | null = null) {
	const known = await findKnown(input);
	const issues: Issues = {};
	const instantOf = instants(site.zone, issues);
	if (!known.partners.get(input.supplierId)?.isSupplier) issues.supplierId = 'There is no such supplier.';
	if (input.carrierId !== null && !known.partners.get(input.carrierId)?.isCarrier)
		issues.carrierId = 'There is no such carrier.';
	const faultOfLane = await laneFault(site, input, ownLaneId);
	if (faultOfLane) issues.laneId = faultOfLane;

	const dueAt = instantOf(input.due, 'due');
	const lines = input.lines.map((row) => prepareLine(row, site, known, instantOf, issues));
	const handovers = input.handovers.map((row) => prepareHandover(row, known, instantOf, issues));
	checkOrder(handovers, issues);
	// Custody ends with us: the last handover is ours, whether the papers say so or not.
	if (handovers.at(-1)?.holder !== site.name)
		handovers.push({
			id: null,
			at: handovers.length,
			partnerId: null,
			holder: site.name,
			place: input.dock ?? '',
			plannedAt: dueAt,
			actualAt: null,
			plusMinusMinutes: 0,
			source: null,
			setPointCelsius: null,
			allowedHours: null
		});
	checkSerials(input.loggers, issues);
	const loggers = input.loggers.map((row) => prepareLogger(row, lines, known, issues));
	refuseFaults(issues);

	const first = lines[0]?.description ?? '';
	const { purchaseOrder, billOfLading, mode, vehicle, seal, dock, supplierId, carrierId, laneId } = input;
	return {
		papers: {
			title: input.title ?? (lines.length > 1 ? `${first}, ${lines.length} lots` : first),
			...{ supplierId, carrierId, laneId, purchaseOrder, billOfLading, mode, vehicle, seal, dock, dueAt },
			termsOfSale: input.termsOfSale,
			rejectWithinHours: input.rejectWithinHours,
			rejectBasis: input.rejectBasis
		},
		lines,
		handovers,
		loggers
	};
}
