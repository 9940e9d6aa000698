import type { Incident } from '../domain/excursions/find-incidents';
import type { LimitTime } from '../domain/excursions/limit-times';
import type { RangePart } from '../domain/receiving/range-parts';

/** Figures of an assessment that records of older engines do not have. */
export interface LaterFigures {
	/** The worst over a rolling window, and how long the window is. */
	worstWindowMktCelsius?: number | null;
	mktWindowHours?: number | null;
	mktLimitCelsius?: number | null;
	rangeParts?: RangePart[];
	limitTimes?: LimitTime[];
	incidents?: Incident[];
}
