import { msPerMinute } from '../../../domain/units';
import { completedKey } from '../../../domain/gs1/check-digit';
import { composedSscc } from '../../../domain/gs1/sscc';
import { shipmentInput, type ShipmentInput } from '../../../schemas/shipment-form';
import { samplePrefix } from '../cast/enter-partners';
import { carriers, suppliers } from '../cast/partners';
import { sites } from '../cast/sites';
import { chanceOf } from '../chance';
import { demoProducts } from '../products';
import { lotOf, type Staged } from './staged';
import { known, type World } from './world';

const iso = (ms: number) => new Date(ms).toISOString();

const firms = new Map([...suppliers, ...carriers].map((firm) => [firm.key, firm]));

function lineOf(world: World, staged: Staged, at: number) {
	const row = staged.goods[at];
	if (!row) throw new Error('There is no such line.');
	const pallets = Math.ceil(row.cases / row.casesPerPallet);
	const chance = chanceOf(`${staged.plan.key} line ${at}`);
	const serial = chance.whole(18_400, 899_000);
	const nth = demoProducts.findIndex(({ name }) => name === row.product);
	return {
		productId: known(world.productIds, row.product),
		description: row.description,
		lot: lotOf(staged, at + 1),
		gtin: completedKey('gtin13', `${samplePrefix}${String(13 + nth).padStart(5, '0')}`),
		ssccs: Array.from({ length: pallets }, (_, n) => composedSscc(1, samplePrefix, serial + n) ?? ''),
		cases: row.cases,
		pallets,
		value: Math.round(row.cases * row.each),
		neededDays: row.neededDays,
		...(row.openingHours === null
			? { openingKind: 'undeclared' }
			: {
					openingKind: 'declared',
					openingHours: row.openingHours,
					openingPlusMinusHours: Math.max(1, Math.round(row.openingHours / 10)),
					openingBasis: 'packed to first reading'
				})
	};
}

function handoversOf(world: World, { legs, advisedMs }: Staged) {
	return legs.map(({ by, holder, place, plannedMs, actualMs, setPointCelsius }) => ({
		partnerId: known(world.partnerIds, by),
		holder: holder ?? known(firms, by).name,
		place,
		planned: iso(plannedMs),
		// What has not happened yet when the docket is opened stands there as planned.
		actual: actualMs <= advisedMs ? iso(actualMs) : null,
		plusMinusMinutes: by === 'merrow' || by === 'sarn' ? 15 : 5,
		source: actualMs <= advisedMs ? 'consignment note' : null,
		setPointCelsius
	}));
}

/** Custody ends with us: at the dock, or behind it. */
function ourHandovers({ plan, lane, dueMs }: Staged) {
	const { name: holder, docks } = sites[lane.site];
	const { intoStore } = plan;
	const dockCelsius = intoStore?.dockCelsius ?? lane.legs.at(-1)?.setPointCelsius;
	const dock = { holder, place: docks[lane.dock], planned: iso(dueMs), setPointCelsius: dockCelsius };
	if (!intoStore) return [dock];
	const planned = iso(dueMs + intoStore.plannedMinutes * msPerMinute);
	return [dock, { holder, place: intoStore.place, planned, setPointCelsius: dockCelsius }];
}

/** The papers of a load, as the advance notice brings them. */
export function papersOf(world: World, staged: Staged, serials: readonly string[]): ShipmentInput {
	const { plan, lane, goods, rides, dueMs } = staged;
	const chance = chanceOf(`${plan.key} papers`);
	const number = chance.whole(100, 999);
	return shipmentInput.parse({
		title: plan.title,
		supplierId: known(world.partnerIds, lane.supplier),
		carrierId: known(world.partnerIds, lane.carrier),
		purchaseOrder: `450-${chance.whole(20_100, 29_900)}`,
		billOfLading: lane.site === 'PS' ? `CMR ${118_000 + number}` : `BOL ${77_000 + number}`,
		mode: lane.mode,
		vehicle: `${known(firms, lane.carrier).prefix}-${chance.pick([12, 31, 68, 71, 101, 118, 207, 209, 4458, 4471])}`,
		seal: String(chance.whole(9_100, 99_800)).padStart(7, '0'),
		dock: sites[lane.site].docks[lane.dock],
		termsOfSale: 'Delivered at place',
		rejectWithinHours: lane.rejectWithinHours,
		rejectBasis: 'Supply terms § 6, from arrival',
		due: iso(dueMs),
		lines: goods.map((_, at) => lineOf(world, staged, at)),
		handovers: [...handoversOf(world, staged), ...ourHandovers(staged)],
		loggers: rides.map(({ line, position, placement }, at) => ({
			serial: serials[at],
			line,
			position,
			placement
		}))
	});
}
