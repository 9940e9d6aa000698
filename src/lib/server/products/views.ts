import type { Product } from '../db/models/product';
import type { Variety } from '../db/models/variety';
import { inOrder, storedGrades } from '../assessments/finding-grades';
import { revisionOf } from '../catalogue/revision';

/** What the form changes, and what the audit trail keeps of a change. */
export function productFields({ name, family, countUnit, dockMayAccept }: Product) {
	return { name, family, countUnit, dockMayAccept };
}

/** What the rules form changes, grades in the order of the rules, so that the same ones have one revision. */
export function productRules(product: Product) {
	const { minimumDatedDays, isNotOlderThanLast, isLoggerRequired } = product;
	return {
		minimumDatedDays,
		isNotOlderThanLast,
		isLoggerRequired,
		grades: inOrder(storedGrades(product.findingGrades))
	};
}

export interface VarietyView {
	id: string;
	name: string;
}

export interface ProductView extends ReturnType<typeof productFields> {
	id: string;
	varieties: VarietyView[];
	createdAt: string;
	switchedOffAt: string | null;
	revision: string;
	rules: ReturnType<typeof productRules> & { revision: string };
}

export function productView(product: Product, varieties: readonly Variety[]): ProductView {
	const fields = productFields(product);
	const rules = productRules(product);
	return {
		id: product.id,
		...fields,
		varieties: varieties
			.filter((variety) => variety.productId === product.id)
			.map(({ id, name }) => ({ id, name })),
		createdAt: product.createdAt.toISOString(),
		switchedOffAt: product.switchedOffAt?.toISOString() ?? null,
		revision: revisionOf(fields),
		rules: { ...rules, revision: revisionOf(rules) }
	};
}
