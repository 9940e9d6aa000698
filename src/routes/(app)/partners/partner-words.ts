import type { PartnerDuty } from '$lib/schemas/partner';

export const dutyWords: Record<PartnerDuty, string> = {
	supplier: 'Supplier',
	carrier: 'Carrier',
	store: 'Store',
	customer: 'Customer'
};

export const dutyFilters = [
	{ value: 'any', label: 'All' },
	{ value: 'supplier', label: 'Suppliers' },
	{ value: 'carrier', label: 'Carriers' },
	{ value: 'store', label: 'Stores' },
	{ value: 'customer', label: 'Customers' }
] as const;

export const stateFilters = [
	{ value: 'in-use', label: 'In use' },
	{ value: 'off', label: 'Switched off' },
	{ value: 'all', label: 'Both' }
] as const;

/** "Supplier, store": the first with a capital. */
export function dutiesText(duties: readonly PartnerDuty[]): string {
	const [first, ...rest] = duties.map((duty) => dutyWords[duty]);
	return [first, ...rest.map((word) => word.toLowerCase())].join(', ');
}
