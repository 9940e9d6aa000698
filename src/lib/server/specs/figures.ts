import type { Spec } from '../../domain/shelf-life/spec';
import { specSchema } from '../../schemas/spec';
import { sha256Hex } from '../storage/sha256';

/** Figures as they are stored, and the hash a signature names. */
export interface StoredFigures {
	text: string;
	sha256: string;
}

/** The one text of these figures: keys in the schema's order, whatever order they came in. */
export function storedFigures(spec: Spec): StoredFigures {
	const text = JSON.stringify(specSchema.parse(spec));
	return { text, sha256: sha256Hex(text) };
}

export function figuresFrom(text: string): Spec {
	return specSchema.parse(JSON.parse(text));
}
