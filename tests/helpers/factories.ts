import { v7 as uuid } from 'uuid';
import { hashPassword } from '../../src/lib/server/accounts/password';
import { loadActor } from '../../src/lib/server/accounts/load-actor';
import type { Context, Role } from '../../src/lib/server/context';
import { Contact } from '../../src/lib/server/db/models/contact';
import { Handover } from '../../src/lib/server/db/models/handover';
import { Organisation } from '../../src/lib/server/db/models/organisation';
import { Partner } from '../../src/lib/server/db/models/partner';
import { Product } from '../../src/lib/server/db/models/product';
import { Shipment } from '../../src/lib/server/db/models/shipment';
import { ShipmentLine } from '../../src/lib/server/db/models/shipment-line';
import { Site } from '../../src/lib/server/db/models/site';
import { SpecVersion } from '../../src/lib/server/db/models/spec-version';
import { User } from '../../src/lib/server/db/models/user';
import { UserSite } from '../../src/lib/server/db/models/user-site';
import { sha256Hex } from '../../src/lib/server/storage/sha256';
import type { Spec } from '../../src/lib/domain/shelf-life/spec';

/** The moment most tests happen at. */
export const testNow = new Date('2026-04-03T07:35:00.000Z');

let counter = 0;
const nth = () => ++counter;

type Overrides<Row> = Partial<Row>;

export async function buildOrganisation(): Promise<Organisation> {
	const known = await Organisation.findOne();
	return (
		known ?? Organisation.create({ id: uuid(), name: 'Pell Staithe', countryCode: 'NL', createdAt: testNow })
	);
}

export async function buildSite(overrides: Overrides<Site> = {}): Promise<Site> {
	const n = nth();
	return Site.create({
		id: uuid(),
		organisationId: (await buildOrganisation()).id,
		code: `S${n}`,
		name: `Pell Staithe ${n}`,
		address: 'Quay 1, Pell',
		gln: '9506000050010',
		zone: 'Europe/Amsterdam',
		temperatureUnit: 'celsius',
		pageSize: 'a4',
		currency: 'EUR',
		opening: {
			mon: ['04:00', '15:00'],
			tue: ['04:00', '15:00'],
			wed: ['04:00', '15:00'],
			thu: ['04:00', '15:00'],
			fri: ['04:00', '15:00']
		},
		docks: ['Dock 1', 'Dock 2'],
		createdAt: testNow,
		...overrides
	});
}

export const testPassword = 'a-long-test-password';

export async function buildUser(
	roles: Role[],
	options: { sites?: Site[]; partner?: Partner } & Overrides<User> = {}
): Promise<User> {
	const { sites = [], partner, ...overrides } = options;
	const n = nth();
	const user = await User.create({
		id: uuid(),
		email: `${roles[0]}${n}@pellstaithe.example`,
		name: `${roles[0]} person ${n}`,
		title: 'Receiving',
		passwordHash: roles.includes('supplier') ? null : await hashPassword(testPassword),
		roles,
		partnerId: partner?.id ?? null,
		createdAt: testNow,
		...overrides
	});
	for (const site of sites) await UserSite.create({ userId: user.id, siteId: site.id });
	return user;
}

/** A context as the hooks would make it for this user. */
export async function contextFor(user: User, now = testNow): Promise<Context> {
	const actor = await loadActor({ kind: 'user', subjectId: user.id, tokenVersion: user.tokenVersion }, now);
	if (!actor) throw new Error('The user cannot sign in.');
	return { actor, now, requestId: `test-${nth()}`, address: '127.0.0.1' };
}

export async function buildPartner(overrides: Overrides<Partner> = {}): Promise<Partner> {
	return Partner.create({
		id: uuid(),
		name: `Olmarisa Berry Growers ${nth()}`,
		isSupplier: true,
		isCarrier: false,
		isStore: false,
		isCustomer: false,
		gln: null,
		address: 'Packhouse 2',
		createdAt: testNow,
		...overrides
	});
}

export async function buildContact(partner: Partner, overrides: Overrides<Contact> = {}): Promise<Contact> {
	return Contact.create({
		id: uuid(),
		partnerId: partner.id,
		name: 'Lucía Ferrán',
		email: `quality${nth()}@olmarisa.example`,
		phone: '',
		duty: 'quality',
		isNotified: true,
		...overrides
	});
}

/** Q10 of 3 at 0 °C, 18 days: easy to work out by hand. */
export const testSpec: Spec = {
	referenceCelsius: 0,
	fullLifeHours: 432,
	fullLifeUncertaintyHours: 0,
	model: { kind: 'constant-q10', q10: 3 },
	validFromCelsius: -2,
	validToCelsius: 25,
	chillingCelsius: null,
	freezingCelsius: -1.3,
	ceilingCelsius: null,
	upper: {
		celsius: 4,
		graceMinutes: 30,
		graceMinutesInAll: 120,
		hysteresisCelsius: 0.5,
		majorMinutes: 120,
		criticalMinutes: 360
	},
	lower: {
		celsius: -0.5,
		graceMinutes: 30,
		graceMinutesInAll: 60,
		hysteresisCelsius: 0.3,
		majorMinutes: 60,
		criticalMinutes: 240
	},
	neededHours: 264,
	openingDefaultHours: 48,
	mkt: { activationEnergyKilojoulesPerMole: null, windowHours: null, limitCelsius: null },
	sources: [],
	caution: null
};

/** A product with one spec in force. */
export async function buildProduct(
	options: { spec?: Spec } & Overrides<Product> = {}
): Promise<{ product: Product; spec: SpecVersion }> {
	const { spec = testSpec, ...overrides } = options;
	const product = await Product.create({
		id: uuid(),
		name: `Blueberries ${nth()}`,
		family: 'berries',
		countUnit: 'case',
		createdAt: testNow,
		...overrides
	});
	const figures = JSON.stringify(spec);
	const version = await SpecVersion.create({
		id: uuid(),
		productId: product.id,
		varietyId: null,
		number: 1,
		state: 'signed',
		figures,
		figuresSha256: sha256Hex(figures),
		reason: 'first version',
		createdAt: testNow,
		signedAt: new Date('2026-01-01T00:00:00Z'),
		inForceFrom: new Date('2026-01-01T00:00:00Z')
	});
	return { product, spec: version };
}

/** An expected load with one line and three handovers, with all the parents it needs. */
export async function buildShipment(
	options: {
		site?: Site;
		supplier?: Partner;
		carrier?: Partner;
		product?: Product;
		lines?: Overrides<ShipmentLine>[];
	} & Overrides<Shipment> = {}
): Promise<{
	shipment: Shipment;
	lines: ShipmentLine[];
	handovers: Handover[];
	site: Site;
	supplier: Partner;
	carrier: Partner;
}> {
	const {
		site: givenSite,
		supplier: givenSupplier,
		carrier: givenCarrier,
		product: givenProduct,
		lines: lineOverrides = [{}],
		...overrides
	} = options;
	const site = givenSite ?? (await buildSite());
	const supplier = givenSupplier ?? (await buildPartner());
	const carrier =
		givenCarrier ??
		(await buildPartner({ name: `Anselm Road Transport ${nth()}`, isSupplier: false, isCarrier: true }));
	const product = givenProduct ?? (await buildProduct()).product;
	const n = nth();
	const shipment = await Shipment.create({
		id: uuid(),
		siteId: site.id,
		number: `${site.code}-26-${String(1000 + n)}`,
		title: 'Blueberries for the weekend',
		supplierId: supplier.id,
		carrierId: carrier.id,
		purchaseOrder: `450-${n}`,
		billOfLading: `CMR ${118000 + n}`,
		mode: 'road',
		vehicle: 'AR-4471',
		seal: '0093187',
		dueAt: new Date('2026-04-03T03:30:00Z'),
		rejectWithinHours: 8,
		rejectBasis: 'Supply terms § 6, from arrival',
		createdAt: testNow,
		...overrides
	});
	const lines = [];
	for (const [index, line] of lineOverrides.entries())
		lines.push(
			await ShipmentLine.create({
				id: uuid(),
				shipmentId: shipment.id,
				ordinal: index + 1,
				productId: product.id,
				description: 'Blueberries, 12 × 125 g',
				lot: `OB-26089-${index + 1}`,
				casesAdvised: 960,
				palletsAdvised: 5,
				valueMinor: 1_382_400,
				currency: 'EUR',
				openingKind: 'declared',
				openingHours: 20,
				openingPlusMinusHours: 2,
				openingBasis: 'harvest to pre-cool',
				...line
			})
		);
	const handovers = [];
	const legs = [
		{
			holder: 'Olmarisa packhouse',
			place: 'cold room',
			plannedAt: '2026-03-30T06:10:00Z',
			partnerId: supplier.id
		},
		{
			holder: 'Anselm Road Transport',
			place: 'road',
			plannedAt: '2026-04-01T18:00:00Z',
			partnerId: carrier.id
		},
		{ holder: site.name, place: 'dock', plannedAt: '2026-04-03T03:30:00Z', partnerId: null }
	];
	for (const [index, leg] of legs.entries())
		handovers.push(
			await Handover.create({
				id: uuid(),
				shipmentId: shipment.id,
				ordinal: index + 1,
				partnerId: leg.partnerId,
				holder: leg.holder,
				place: leg.place,
				plannedAt: new Date(leg.plannedAt),
				actualAt: new Date(leg.plannedAt),
				plusMinusMinutes: 0,
				source: 'papers',
				setPointCelsius: 0.5
			})
		);
	return { shipment, lines, handovers, site, supplier, carrier };
}
