import type { Whereabouts } from '../../../domain/receiving/line-groups';
import type { Outcome } from '../../../domain/receiving/recommendation';
import type { PhotoKind } from '../../../schemas/photo';
import type { Incident, LayoutName, Ride } from '../journeys/journey';
import type { Goods } from './lane';
import type { LaneName } from './lanes';
import type { PictureName } from '../play/pictures';

/** A moment: so many minutes from the anchor, or a time of the site's clock so many days from its day. */
export type When = { minutes: number } | { day: number; clock: string };

/** Some pallets of a line that are decided by themselves. */
export interface PlannedGroup {
	name: string;
	pallets: number;
	outcome: Outcome;
	/** The condition, why it is refused or held. */
	words?: string;
	/** Of a held group: what is awaited, and for so many hours after the decision. */
	awaited?: { what: string; hours: number };
	whereabouts?: Whereabouts;
	place?: string;
}

/** What becomes of a decision afterwards. */
export interface Aftermath {
	/** The supplier's answer, so many hours after the decision. */
	answer?: { kind: 'acknowledge' | 'dispute'; afterHours: number; text: string };
	/** A claim against one of those who held the goods. */
	claim?: {
		afterHours: number;
		against: string;
		/** Part of the refused value that is asked for. */
		fraction: number;
		basis: string;
		/** How it went on. */
		then?: readonly { status: 'noticed' | 'filed' | 'settled' | 'declined'; afterHours: number }[];
	};
}

/** One load of the demo: what was planned, what happened, how far it got. */
export interface LoadPlan {
	/** Seeds its chance; its own, whatever the others do. */
	key: string;
	lane: LaneName;
	due: When;
	title?: string;
	/** Hours each leg overran, from the first. */
	lateHours?: readonly number[];
	goods?: readonly Goods[];
	/** Left out: one for each line. */
	rides?: readonly Partial<Ride>[];
	incidents?: readonly Incident[];
	/** Not here yet. */
	isExpected?: boolean;
	cancelled?: string;
	seal?: 'broken' | 'other';
	/** Cases that did not come, of the first line. */
	short?: number;
	pulpCelsius?: readonly number[];
	doorNote?: string;
	/** The load went on from the dock into store, so many minutes after the arrival; its loggers rode along. */
	intoStore?: { minutes: number; plannedMinutes: number; place: string; dockCelsius: number };
	/** Left out: as soon as the papers are done. */
	readAfterMinutes?: number;
	/** Exports read and kept; left out: all. */
	reads?: number;
	/** Another export was uploaded, and asks something. */
	question?: Extract<LayoutName, 'two-probes' | 'no-unit'>;
	photos?: readonly { shows: PictureName; kind: PhotoKind; afterMinutes: number; caption: string }[];
	notes?: readonly { by: 'dock' | 'qa'; afterMinutes: number; text: string }[];
	hold?: { afterMinutes: number; reason: string };
	/** QA leaves the first minutes out of every trace. */
	trimFirstMinutes?: number;
	/** Left out: not decided yet. */
	decided?: {
		afterMinutes: number;
		/** By line; left out: as recommended, conditions where a hold is. */
		outcomes?: readonly Outcome[];
		reasons?: string;
		condition?: string;
		notify?: boolean;
		/** The first line is decided by groups, each of so many pallets; the last takes the cases that are left. */
		groups?: readonly PlannedGroup[];
	};
	aftermath?: Aftermath;
}
