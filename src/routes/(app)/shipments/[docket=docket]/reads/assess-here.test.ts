// @vitest-environment node
import { describe, expect, it } from 'vitest';
import { readExport } from '$lib/domain/ingest/read-export';
import type { DeviceInputs } from '$lib/schemas/read';
import { buildLimit, buildSpec } from '../../../../../../tests/accuracy/build';
import { assessHere, loggerOf } from './assess-here';

const context = {
	uploadedMs: Date.UTC(2026, 3, 20, 12),
	siteZone: 'UTC',
	journeyFromMs: null,
	journeyToMs: null,
	answers: {}
};
/** Two days at just one temperature, a reading every hour. */
const text = (celsius: number, serial = 'WH-1') =>
	[
		`Serial;${serial}`,
		'',
		'time;celsius',
		...Array.from(
			{ length: 49 },
			(_, i) => `${new Date(Date.UTC(2026, 3, 3) + i * 3_600_000).toISOString()};${celsius}`
		)
	].join('\n');
const understood = (content: string) => {
	const found = readExport(new TextEncoder().encode(content), context);
	if (found.kind !== 'ok') throw new Error(JSON.stringify(found));
	return found.understanding;
};

const spec = buildSpec({ upper: buildLimit(4), freezingCelsius: -1 });
const handover = {
	holder: 'H',
	place: 'P',
	plannedMs: null,
	plusMinusMinutes: 0,
	setPointCelsius: null,
	allowedHours: null
};
const inputs = (more: Partial<DeviceInputs> = {}): DeviceInputs => ({
	lines: ['one', 'two'].map((id) => ({
		id,
		name: `Line ${id}`,
		compartmentId: null,
		spec,
		opening: { kind: 'declared', hours: 24, plusMinusHours: 0, basis: 'packed' },
		handovers: [
			{ ...handover, id: 'a', actualMs: Date.UTC(2026, 3, 3) },
			{ ...handover, id: 'b', actualMs: Date.UTC(2026, 3, 5) }
		],
		neededHours: 48
	})),
	loggers: [
		{ serial: 'WH-1', accuracyCelsius: 0.5, placement: 'between-cases', lineId: 'two', compartmentId: null }
	],
	...more
});

describe('the logger of a file', () => {
	const [logger] = inputs().loggers;
	it('is the one it names, else the only one that is expected, and never a guess', () => {
		expect(loggerOf('WH-1', inputs().loggers)).toEqual(logger);
		expect(loggerOf(null, inputs().loggers)).toEqual(logger);
		expect(loggerOf('WH-2', inputs().loggers)).toBeNull();
		expect(loggerOf(null, logger ? [logger, { ...logger, serial: 'WH-3' }] : [])).toBeNull();
	});
});

describe('life worked out on the device', () => {
	it('is full life less the opening balance and two days at the reference temperature', () => {
		const [life, ...others] = assessHere(understood(text(spec.referenceCelsius)), inputs());
		expect(others).toEqual([]);
		expect(life).toMatchObject({
			line: 'Line two',
			serial: 'WH-1',
			neededHours: 48,
			excursions: 0,
			hasStop: false
		});
		// At its reference temperature an hour of life is an hour: the definition of the unit.
		expect(life?.remainingHours.value).toBeCloseTo(spec.fullLifeHours - 24 - 48, 9);
	});

	it('is said for each line where the logger rode for all, with what went wrong', () => {
		const [logger] = inputs().loggers;
		const loggers = logger ? [{ ...logger, lineId: null }] : [];
		const lives = assessHere(understood(text(9)), inputs({ loggers }));
		expect(lives.map(({ line, excursions }) => [line, excursions])).toEqual([
			['Line one', 1],
			['Line two', 1]
		]);
		expect(assessHere(understood(text(-3)), inputs({ loggers }))[0]?.hasStop).toBe(true);
	});

	it('is none where the logger is not known, or its readings lie outside the journey', () => {
		expect(assessHere(understood(text(2, 'WH-77')), inputs())).toEqual([]);
		const lines = inputs().lines.map((line) => ({
			...line,
			handovers: line.handovers.map((one) => ({ ...one, actualMs: (one.actualMs ?? 0) - 30 * 86_400_000 }))
		}));
		expect(assessHere(understood(text(2)), inputs({ lines }))).toEqual([]);
	});
});
