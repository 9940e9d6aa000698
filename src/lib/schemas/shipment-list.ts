import { z } from 'zod';
import type { Stage, Verdict } from './docket';
import { choice, listQuery } from './list';
import { optionalDay, optionalId } from './shipment-parts';

export const stageFilters = ['any', 'expected', 'at-the-door', 'on-hold', 'done', 'cancelled'] as const;
export const shipmentSorts = ['due', 'number', 'arrived', 'supplier', 'carrier'] as const;

/** What the list of dockets takes from its address. Without an order, the newest due stand first. */
export const shipmentListQuery = listQuery(shipmentSorts).extend({
	dir: z.enum(['asc', 'desc']).catch('desc'),
	stage: choice(stageFilters),
	supplier: optionalId.catch(null),
	carrier: optionalId.catch(null),
	product: optionalId.catch(null),
	from: optionalDay.catch(null),
	to: optionalDay.catch(null)
});
export type ShipmentListQuery = z.output<typeof shipmentListQuery>;

/** One docket in the list. */
export interface ShipmentRow {
	id: string;
	number: string;
	title: string;
	stage: Stage;
	isCancelled: boolean;
	verdict: Verdict | null;
	supplier: string;
	carrier: string | null;
	vehicle: string | null;
	purchaseOrder: string | null;
	dueAt: string | null;
	arrivedAt: string | null;
	decidedAt: string | null;
	cases: number;
}
