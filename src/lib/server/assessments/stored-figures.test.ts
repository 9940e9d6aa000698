import { describe, expect, it } from 'vitest';
import { buildHandover, buildInput, buildSpec, buildTrace, startMs } from '../../../../tests/accuracy/build';
import { assess } from '../../domain/receiving/assess';
import type { PinnedInputs } from './assessment-inputs';
import { figuresText, parseFigures, parseInputs } from './stored-figures';

const sha = 'a'.repeat(64);

function inputsWith(basis: string): PinnedInputs {
	const opening = { kind: 'declared', hours: 3, plusMinusHours: 1, basis } as const;
	return {
		engineVersion: '1.2.0',
		specVersionId: 'spec',
		specSha256: sha,
		traceSha256: sha,
		fileSha256: sha,
		layoutFingerprint: null,
		clockShiftMs: 0,
		accuracyCelsius: 0.5,
		placement: 'air',
		opening,
		handovers: [buildHandover(basis, startMs)],
		trims: [],
		neededHours: 12
	};
}

function textWith(basis: string): string {
	const handovers = [buildHandover(basis, startMs), buildHandover('B', startMs + 3_600_000)];
	return figuresText(
		assess(buildInput(buildTrace([2, 3, 4, 5, 5, 5, 5]), buildSpec(), { handovers })),
		inputsWith(basis),
		1.5
	);
}

describe('what stored figures rest on', () => {
	it.each([
		'harvest note',
		'',
		'says ","trimmedHours":9,"inputs":{}',
		',"trimmedHours":7}',
		'\\","trimmedHours":8',
		'line\nbreak "quoted" \u2028'
	])('is read alone as it is read with all of them, whatever somebody wrote: %j', (basis) => {
		const text = textWith(basis);
		const { inputs, trimmedHours } = parseFigures(text);
		expect(parseInputs(text)).toEqual({ inputs, trimmedHours });
		expect(inputs).toEqual(inputsWith(basis));
		expect(trimmedHours).toBe(1.5);
	});

	it('is found in figures that were written in another order too', () => {
		const { inputs, trimmedHours } = parseFigures(textWith('note'));
		const text = JSON.stringify({ trimmedHours, inputs, readings: 7 });
		expect(parseInputs(text)).toMatchObject({ inputs, trimmedHours });
	});

	it('leaves the series out', () => {
		expect(textWith('note')).not.toContain('usedLowHours');
	});
});
