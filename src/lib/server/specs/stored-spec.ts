import type { Spec } from '../../domain/shelf-life/spec';

/** The figures of a version's stored text. They were validated when it was saved, and the engine checks them again. */
export function parseSpecFigures(text: string): Spec {
	return JSON.parse(text) as Spec;
}
