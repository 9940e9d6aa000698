import { v7 as uuid } from 'uuid';
import { packTrace } from '../../src/lib/domain/trace/pack';
import type { Trace } from '../../src/lib/domain/trace/trace';
import { Logger } from '../../src/lib/server/db/models/logger';
import { LoggerRead } from '../../src/lib/server/db/models/logger-read';
import { LoggerTrip } from '../../src/lib/server/db/models/logger-trip';
import type { Shipment } from '../../src/lib/server/db/models/shipment';
import { TraceRow } from '../../src/lib/server/db/models/trace-row';
import type { User } from '../../src/lib/server/db/models/user';
import { keepBytes } from '../../src/lib/server/storage/store';
import { sha256Hex } from '../../src/lib/server/storage/sha256';
import { testNow } from './factories';

let counter = 0;

/** One temperature held from first to last instant, a reading every so many minutes. */
export function steadyTrace(celsius: number, fromAt: string, toAt: string, everyMinutes = 10): Trace {
	const from = Date.parse(fromAt);
	const count = Math.floor((Date.parse(toAt) - from) / (everyMinutes * 60_000)) + 1;
	return {
		unit: 'celsius',
		decimals: 1,
		times: Float64Array.from({ length: count }, (_, i) => from + i * everyMinutes * 60_000),
		scaled: new Int32Array(count).fill(Math.round(celsius * 10))
	};
}

/** A kept read with its one trace, its trip, and its logger on the register. */
export async function buildTrace(
	shipment: Shipment,
	uploader: User,
	trace: Trace,
	overrides: Partial<LoggerTrip> & { accuracyCelsius?: number; calibrationDueOn?: string | null } = {}
): Promise<{ read: LoggerRead; row: TraceRow; trip: LoggerTrip; logger: Logger }> {
	const n = ++counter;
	const { accuracyCelsius = 0.5, calibrationDueOn = '2027-01-31', ...trip } = overrides;
	const serial = overrides.serial ?? `WH-${String(1000 + n)}`;
	const file = await keepBytes(Buffer.from(`time;celsius ${n}`), 'text/csv', testNow);
	const logger = await Logger.create({
		id: uuid(),
		serial,
		kind: 'reusable',
		ownerId: null,
		accuracyCelsius,
		startDelayMinutes: 0,
		calibrationDueOn,
		note: '',
		createdAt: testNow,
		switchedOffAt: null
	});
	const made = await LoggerTrip.create({
		id: uuid(),
		shipmentId: shipment.id,
		loggerId: logger.id,
		serial,
		ordinal: n,
		lineId: null,
		palletId: null,
		position: 'pallet 1, nose',
		placement: 'between-cases',
		status: 'found',
		...trip
	});
	const read = await LoggerRead.create({
		id: uuid(),
		shipmentId: shipment.id,
		fileId: file.id,
		part: 0,
		fileName: `${serial}.csv`,
		state: 'ok',
		answers: {},
		layoutId: null,
		understanding: null,
		refusalCode: null,
		readerVersion: '1',
		zoneDataVersion: null,
		uploadedBy: uploader.id,
		uploadedAt: testNow,
		keptAt: testNow,
		askedQaAt: null
	});
	const packed = Buffer.from(packTrace(trace));
	const row = await TraceRow.create({
		id: uuid(),
		readId: read.id,
		shipmentId: shipment.id,
		ordinal: 0,
		name: 'Temperature',
		quantity: 'temperature',
		unit: trace.unit,
		decimals: trace.decimals,
		readings: trace.times.length,
		firstAt: new Date(trace.times[0] ?? 0),
		lastAt: new Date(trace.times[trace.times.length - 1] ?? 0),
		usualIntervalMs: 600_000,
		minCelsius: null,
		maxCelsius: null,
		meanCelsius: null,
		packed,
		contentSha256: sha256Hex(packed),
		tripId: made.id,
		isAssessed: true
	});
	return { read, row, trip: made, logger };
}
