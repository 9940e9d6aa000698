import { v7 as uuid } from 'uuid';
import type { PreparedPapers } from './prepare-papers';

/** Cases spread over the pallets so that they add up. */
function casesOfPallets(cases: number, pallets: number): number[] {
	return Array.from(
		{ length: pallets },
		(_, at) => Math.floor((cases * (at + 1)) / pallets) - Math.floor((cases * at) / pallets)
	);
}

type PreparedLine = PreparedPapers['lines'][number];

/** The pallets of a line, each with its label where the papers name one. */
export function palletRows(line: PreparedLine, lineId: string) {
	return casesOfPallets(line.casesAdvised, line.palletsAdvised).map((cases, at) => ({
		id: uuid(),
		lineId,
		ordinal: at + 1,
		sscc: line.ssccs[at] ?? null,
		cases
	}));
}

/** The fields of a line as its row keeps them. */
export function lineFields({ id: _id, at: _at, ssccs: _ssccs, ...fields }: PreparedLine) {
	return fields;
}

/**
 * The rows of a docket, with their ids: made before the transaction, which may have to run twice. Rows that the
 * papers name by id keep it.
 */
export function docketRows(prepared: PreparedPapers, shipmentId: string) {
	const lines = prepared.lines.map((line, at) => ({
		...lineFields(line),
		id: line.id ?? uuid(),
		shipmentId,
		ordinal: at + 1
	}));
	const lineIdAt = (at: number | null) =>
		lines[prepared.lines.findIndex((line) => line.at === at)]?.id ?? null;
	return {
		lines,
		pallets: prepared.lines.flatMap((line, at) => palletRows(line, lines[at]?.id ?? '')),
		handovers: prepared.handovers.map(({ at: _at, ...row }, at) => ({
			...row,
			id: row.id ?? uuid(),
			shipmentId,
			ordinal: at + 1
		})),
		trips: prepared.loggers.map(({ lineAt, ...row }, at) => ({
			...row,
			id: row.id ?? uuid(),
			shipmentId,
			ordinal: at + 1,
			lineId: lineIdAt(lineAt),
			status: 'expected' as const
		}))
	};
}

/** What a docket's papers become in the tables. */
export type DocketRows = ReturnType<typeof docketRows>;
