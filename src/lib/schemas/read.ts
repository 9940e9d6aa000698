import { z } from 'zod';
import type {
	Channel,
	Declared,
	Question,
	ReadContext,
	RefusalCode,
	Understanding
} from '../domain/ingest/ingestion';
import type { AssessInput } from '../domain/receiving/assessment';
import { placements, type Placement } from '../domain/trace/trace';
import type { TemperatureUnit } from '../domain/units';
import type { ClockCorrectionView } from './clock-correction';
import type { LayoutView } from './layout';
import { decimalField, neededText, optionalText, ticked } from './field';

/** The largest export taken, in bytes: 50 MB as people count them. */
export const maxUploadBytes = 50_000_000;
/** Files of one upload. */
export const maxUploadFiles = 20;

/** A channel without its readings: those stand in the trace. */
export type ChannelSummary = Omit<Channel, 'trace' | 'lines' | 'longSteps' | 'unit'> & {
	/** Of its trace; null where it has none. */
	unit: TemperatureUnit | null;
};

/** What was understood of a file, and with what knowledge beside it: enough to read it again to the same digits. */
export type StoredIngestion =
	| ({ kind: 'ok'; context: ReadContext; channels: ChannelSummary[] } & Omit<Understanding, 'channels'>)
	| { kind: 'question'; context: ReadContext; question: Question; declared: Declared }
	| {
			kind: 'refused';
			context: ReadContext;
			code: RefusalCode;
			line: number | null;
			found: string | null;
	  };

export const readStates = ['question', 'understood', 'kept', 'refused', 'withdrawn'] as const;
/** Where a read stands; `understood` is read and not kept yet. */
export type ReadState = (typeof readStates)[number];

/** One upload in the list of a docket. */
export interface ReadRowView {
	id: string;
	fileName: string;
	fileBytes: number;
	fileSha256: string;
	state: ReadState;
	uploadedAt: string;
	uploadedBy: string;
	keptAt: string | null;
	askedQaAt: string | null;
	readings: number | null;
	serial: string | null;
	firstAt: string | null;
	lastAt: string | null;
	/** Why it was refused, or what it asks. */
	sentence: string | null;
}

/** A logger this file may be from: expected on the load, or on the register. */
export interface LoggerChoice {
	serial: string;
	lineId: string | null;
	compartment: string | null;
	position: string | null;
	placement: Placement;
	accuracyCelsius: number | null;
}

/** A read with everything its page shows. */
export interface ReadView extends ReadRowView {
	docket: { number: string; title: string; isSigned: boolean };
	zone: string;
	ingestion: StoredIngestion | null;
	/** Other dockets in sight that hold the same bytes. */
	alsoOn: string[];
	lines: { id: string; ordinal: number; product: string; lot: string }[];
	/** Names of the chambers the docket speaks of. */
	compartments: string[];
	expected: LoggerChoice[];
	/** What is filled in for the reader to confirm. */
	proposed: LoggerChoice;
	traceIds: string[];
	/** What a person has put right about its clock; null where nothing. */
	clockCorrection: ClockCorrectionView | null;
	supplierName: string;
	/** The remembered answer it was read by, or, `isFromHere`, that was confirmed on it. */
	remembered: (LayoutView & { isFromHere: boolean }) | null;
}

/** Answer of an upload: what became of each file, in the order they came. */
export interface UploadAnswer {
	reads: (ReadRowView & { isDuplicate: boolean; alsoOn: string[] })[];
	refused: { fileName: string; code: string; message: string }[];
}

/** A field of a form that an API call may send as JSON has it: a number, true, null. */
function fromJson<Field extends z.ZodType>(field: Field) {
	return z.preprocess((value) => {
		if (value === null || value === false) return '';
		return typeof value === 'number' || value === true ? String(value) : value;
	}, field);
}

/** Which of the choices shown is right. */
export const answerForm = z.object({
	choice: z.coerce.number({ error: 'Choose one of the answers.' }).int().min(0).max(9),
	remember: fromJson(ticked)
});

const notAnAccuracy = 'Enter the accuracy from the logger’s data sheet, from 0.01 to 5 °C.';

/** Where the logger rode, and what it is. The accuracy is asked where the serial is not on the register. */
export const keepForm = z.object({
	serial: neededText(60, 'Enter the logger’s serial, as printed on it.'),
	lineId: fromJson(
		z
			.union([z.literal(''), z.uuid('Choose a line from the list.')])
			.default('')
			.transform((id) => id || null)
	),
	/** Not sent: where the papers have it. Empty: in none, so it speaks for lines that are in none. */
	compartment: z
		.union([z.string().trim().max(40, 'Keep it to 40 characters.'), z.null()])
		.transform((name) => name || null)
		.optional(),
	position: fromJson(optionalText(120)).transform((text) => text || null),
	placement: z.enum(placements, 'Choose where the sensor rode.'),
	accuracyCelsius: fromJson(decimalField(notAnAccuracy, { min: 0.01, max: 5 }))
});
export type KeepForm = z.output<typeof keepForm>;

export const accuracyNeeded =
	'This serial is not on the register. Enter the accuracy from the logger’s data sheet, from 0.01 to 5 °C.';

export const withdrawForm = z.object({
	reason: neededText(300, 'Say why the read is withdrawn.')
});

/** A line of the docket with what its life is worked out by. */
export interface DeviceLine extends Pick<AssessInput, 'spec' | 'opening' | 'handovers'> {
	id: string;
	name: string;
	compartmentId: string | null;
	neededHours: number;
}

/** A logger that is still expected on the load. */
export interface DeviceLogger {
	serial: string;
	accuracyCelsius: number;
	placement: Placement;
	/** Null: it rode for all lines of its compartment. */
	lineId: string | null;
	compartmentId: string | null;
}

/** What the dock's device assesses a file by, before it is sent. */
export interface DeviceInputs {
	lines: DeviceLine[];
	loggers: DeviceLogger[];
}
