import type { Ingestion, Oddity, Question, ReadContext, RefusalCode } from '$lib/domain/ingest/ingestion';
import type { Quantity } from '$lib/domain/trace/trace';
import type { DeviceInputs } from '$lib/schemas/read';
import { assessHere, type LifeHere } from './assess-here';

/** What this device made of a file before it was sent: the same as the server will, without the readings. */
export type Glance =
	| {
			kind: 'ok';
			readings: number;
			firstMs: number;
			lastMs: number;
			usualIntervalMs: number;
			channels: readonly GlanceChannel[];
			oddities: readonly Oddity[];
			/** Life left of the lines its logger rode with; none where that is not known yet. */
			lives: readonly LifeHere[];
	  }
	| { kind: 'question'; question: Question }
	| { kind: 'refused'; code: RefusalCode; line: number | null; found: string | null };

/** A column of the file in figures. */
export interface GlanceChannel {
	name: string;
	quantity: Quantity;
	readings: number;
	minCelsius: number | null;
	maxCelsius: number | null;
	isAssessed: boolean;
}

/** Sent to the reader beside the page, and back. */
export interface GlanceOrder {
	id: string;
	file: File;
	context: ReadContext;
	inputs: DeviceInputs;
}
export interface GlanceAnswer {
	id: string;
	/** Null where this device could not read it: too little memory, or a file that is gone. */
	glance: Glance | null;
}

/** What is worth showing of a reading at once; its readings stay behind. */
export function glanceOf(ingestion: Ingestion, inputs: DeviceInputs): Glance {
	if (ingestion.kind === 'question') return { kind: 'question', question: ingestion.question };
	if (ingestion.kind === 'refused') return ingestion;
	const { readings, firstMs, lastMs, usualIntervalMs, oddities, channels, temperature } =
		ingestion.understanding;
	return {
		kind: 'ok',
		readings,
		firstMs,
		lastMs,
		usualIntervalMs,
		oddities,
		lives: assessHere(ingestion.understanding, inputs),
		channels: channels.map((channel, at) => ({
			name: channel.name,
			quantity: channel.quantity,
			readings: channel.readings,
			minCelsius: channel.minCelsius,
			maxCelsius: channel.maxCelsius,
			isAssessed: at === temperature
		}))
	};
}
