import type { ReadContext } from '../../src/lib/domain/ingest/ingestion';
import { readExport } from '../../src/lib/domain/ingest/read-export';
import { assess } from '../../src/lib/domain/receiving/assess';
import { canonicalTraceBytes } from '../../src/lib/domain/trace/digest';
import { packTrace } from '../../src/lib/domain/trace/pack';
import { buildInput, buildLimit, buildSpec } from './build';

/** Every number in its shortest exact form, those that JSON has no word for by name: equal texts are equal bits. */
function exactText(value: unknown): string {
	return JSON.stringify(value, (_, part: unknown) => {
		if (ArrayBuffer.isView(part))
			return Array.from(part as unknown as ArrayLike<number>, (n) => exactNumber(n));
		return typeof part === 'number' ? exactNumber(part) : part;
	});
}

function exactNumber(n: number): number | string {
	return Object.is(n, -0) || !Number.isFinite(n) ? (Object.is(n, -0) ? '-0' : String(n)) : n;
}

const spec = buildSpec({
	model: { kind: 'arrhenius', activationEnergyKilojoulesPerMole: 83.144 },
	upper: buildLimit(4, { graceMinutes: 30, hysteresisCelsius: 0.5 }),
	lower: buildLimit(-1),
	freezingCelsius: -1.5,
	ceilingCelsius: 12
});

/** All that is understood of an export and what a product makes of it, as one text; the same bits, the same text. */
export function readAndAssess(bytes: Uint8Array, context: ReadContext): string {
	const ingestion = readExport(bytes, context);
	if (ingestion.kind !== 'ok') return exactText(ingestion);
	const { channels, temperature } = ingestion.understanding;
	const trace = channels[temperature]?.trace;
	if (!trace) return exactText(ingestion);
	return exactText({
		ingestion,
		canonical: canonicalTraceBytes(trace),
		packed: packTrace(trace),
		assessment: assess(buildInput(trace, spec, { accuracyCelsius: 0.5 }))
	});
}
