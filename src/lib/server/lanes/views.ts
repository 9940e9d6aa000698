import type { Lane } from '../db/models/lane';
import { inOrder, storedGrades } from '../assessments/finding-grades';
import { revisionOf } from '../catalogue/revision';

/** What the form changes, and what the audit trail keeps of a change; grades in the order of the rules. */
export function laneFields(lane: Lane) {
	const { name, siteId, supplierId, isLoggerRequired } = lane;
	return { name, siteId, supplierId, isLoggerRequired, grades: inOrder(storedGrades(lane.findingGrades)) };
}

export interface LaneView extends ReturnType<typeof laneFields> {
	id: string;
	siteName: string;
	/** Null: from any supplier. */
	supplierName: string | null;
	switchedOffAt: string | null;
	revision: string;
}

export function laneView(lane: Lane, siteName: string, supplierName: string | null): LaneView {
	const fields = laneFields(lane);
	return {
		id: lane.id,
		...fields,
		siteName,
		supplierName,
		switchedOffAt: lane.switchedOffAt?.toISOString() ?? null,
		revision: revisionOf(fields)
	};
}
