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

const restKey = ',"trimmedHours":';

/** What the figures rest on alone, which is written last: a quote within a text is escaped, so the key is the key. */
export function parseInputs(text: string): Pick<StoredFigures, 'inputs' | 'trimmedHours'> {
	const at = text.indexOf(restKey);
	if (at < 0) return parseFigures(text);
	return JSON.parse(`{${text.slice(at + 1)}`) as Pick<StoredFigures, 'inputs' | 'trimmedHours'>;
}
