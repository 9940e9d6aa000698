import type { Assessment } from '../../domain/receiving/assessment';
import type { PinnedInputs } from './assessment-inputs';

/** An assessment as it is stored: without the series, which is worked out again when asked for, with what it rests on. */
export interface StoredFigures extends Omit<Assessment, 'series'> {
	inputs: PinnedInputs;
	/** Time that a person left out, within the readings. */
	trimmedHours: number;
}

/** The text that goes into the row. */
export function figuresText(assessment: Assessment, inputs: PinnedInputs, trimmedHours: number): string {
	const { series: _, ...figures } = assessment;
	return JSON.stringify({ ...figures, trimmedHours, inputs } satisfies StoredFigures);
}

/** The figures of a row's text. */
export function parseFigures(text: string): StoredFigures {
	return JSON.parse(text) as StoredFigures;
}
