import type { WhereOptions } from 'sequelize';
import type { Spec } from '../../domain/shelf-life/spec';
import { rowsPerPage } from '../../schemas/list';
import type { ProductQuery } from '../../schemas/product';
import { inState, searchIn } from '../catalogue/search';
import type { Context } from '../context';
import { Product } from '../db/models/product';
import { Variety } from '../db/models/variety';
import { authorize } from '../policies';
import { listStandings, type Standing } from '../specs/list-standings';
import { productView, type ProductView } from './views';

/** A product as the list shows it. */
export interface ProductRow extends ProductView {
	/** The signed version that holds now; the product's own, else its first variety's. */
	inForce: { number: number; figures: Spec } | null;
	/** Number of the draft somebody is working on. */
	draftNumber: number | null;
}

/** Figures to sort by; what has none goes last either way. */
const sortFigures = {
	life: ({ inForce }: ProductRow) => inForce?.figures.fullLifeHours ?? null,
	needed: ({ inForce }: ProductRow) => inForce?.figures.neededHours ?? null,
	upper: ({ inForce }: ProductRow) => inForce?.figures.upper?.celsius ?? null,
	version: ({ inForce }: ProductRow) => inForce?.number ?? null
} as const;

/**
 * The products with the spec in force of each. A firm has some hundreds, and their figures are read to be sorted by,
 * so the list is cut into pages here.
 * @throws Refusal `not-allowed`
 */
export async function listProducts(
	ctx: Context,
	query: ProductQuery
): Promise<{ items: ProductRow[]; total: number; families: string[] }> {
	authorize(ctx, 'catalogue.view');
	const products = await Product.findAll({
		where: {
			...searchIn<Product>(['name', 'family'], query.q),
			...(query.family ? { family: query.family } : {}),
			...inState(query.state)
		} as WhereOptions<Product>,
		order: [
			['name', 'asc'],
			['id', 'asc']
		]
	});
	const productIds = products.map((product) => product.id);
	const varieties = await Variety.findAll({ where: { productId: productIds }, order: [['name', 'asc']] });
	const standings = await listStandings(productIds, ctx.now);
	const rows = products.map((product) => rowOf(productView(product, varieties), standings));
	const from = (query.page - 1) * rowsPerPage;
	return {
		items: sorted(rows, query).slice(from, from + rowsPerPage),
		total: rows.length,
		families: await listFamilies(ctx)
	};
}

/** Families in use, for a filter and for the form's suggestions. @throws Refusal `not-allowed` */
export async function listFamilies(ctx: Context): Promise<string[]> {
	authorize(ctx, 'catalogue.view');
	const rows = await Product.findAll({
		attributes: ['family'],
		group: ['family'],
		order: [['family', 'asc']]
	});
	return rows.map((row) => row.family);
}

function rowOf(product: ProductView, standings: readonly Standing[]): ProductRow {
	const own = standings.filter((standing) => standing.productId === product.id);
	const order = [null, ...product.varieties.map((variety) => variety.id)];
	const ranked = order.flatMap((varietyId) => own.filter((standing) => standing.varietyId === varietyId));
	return {
		...product,
		inForce: ranked.find((standing) => standing.inForce)?.inForce ?? null,
		draftNumber: ranked.find((standing) => standing.draftNumber !== null)?.draftNumber ?? null
	};
}

function sorted(rows: ProductRow[], { sort, dir }: ProductQuery): ProductRow[] {
	const way = dir === 'desc' ? -1 : 1;
	if (sort === 'name') return way === 1 ? rows : [...rows].reverse();
	if (sort === 'family') return [...rows].sort((a, b) => way * a.family.localeCompare(b.family, 'en'));
	const figureOf = sortFigures[sort];
	return [...rows].sort((a, b) => {
		const [first, second] = [figureOf(a), figureOf(b)];
		if (first === null || second === null) return Number(first === null) - Number(second === null);
		return way * (first - second);
	});
}
