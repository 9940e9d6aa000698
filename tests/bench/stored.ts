import { mkdtempSync, rmSync } from 'node:fs';
import { availableParallelism, tmpdir } from 'node:os';
import { join } from 'node:path';
import { v7 as uuid } from 'uuid';
import { startDatabase } from '../../src/cli/setup/mariadb.mjs';
import { assess } from '../../src/lib/domain/receiving/assess';
import { engineVersion } from '../../src/lib/domain/receiving/engine-version';
import { packTrace } from '../../src/lib/domain/trace/pack';
import { SharedRoom } from '../../src/lib/domain/trace/room';
import {
	assessInputOf,
	inputsSha256,
	type PinnedInputs
} from '../../src/lib/server/assessments/assessment-inputs';
import { checkAllAssessments } from '../../src/lib/server/assessments/check-all';
import { figuresText } from '../../src/lib/server/assessments/stored-figures';
import { migrate } from '../../src/lib/server/db/migrate';
import { AssessmentRow } from '../../src/lib/server/db/models/assessment-row';
import { LoggerRead } from '../../src/lib/server/db/models/logger-read';
import { Shipment } from '../../src/lib/server/db/models/shipment';
import { ShipmentLine } from '../../src/lib/server/db/models/shipment-line';
import { TraceRow } from '../../src/lib/server/db/models/trace-row';
import { closeDatabase, openDatabase } from '../../src/lib/server/db/sequelize';
import { sha256Hex } from '../../src/lib/server/storage/sha256';
import { buildProduct, buildShipment, buildUser, testNow } from '../helpers/factories';
import { buildTrace } from '../helpers/trace-factory';
import { coldRoomTrace, inputOf } from './engine';

/** What checking stored assessments took, the database included. */
export interface StoredSeconds {
	shipments: number;
	readings: number;
	seconds: number;
	/** Of all threads of this process; the database's own come on top. */
	processorSeconds: number;
	threads: number;
	isSound: boolean;
}

const rowsAtOnce = 200;

/** Stores so many shipments with an assessed trace each on a private database, then recomputes them all. */
export async function measureStored(shipments: number, readingsEach: number): Promise<StoredSeconds> {
	const folder = mkdtempSync(join(tmpdir(), 'wharfinger-bench-'));
	const server = await startDatabase(folder, ['--innodb-buffer-pool-size=256M']);
	Object.assign(process.env, {
		DATABASE_URL: server.appUrl,
		WHARFINGER_DATA: folder,
		AUTH_SECRET: 'of-a-database-that-lives-for-one-measurement'
	});
	try {
		await migrate(server.ownerUrl, server.appUrl);
		openDatabase(server.appUrl);
		await store(shipments, readingsEach);
		await closeDatabase();
		const threads = availableParallelism();
		const start = performance.now();
		const spent = process.cpuUsage();
		const report = await checkAllAssessments(server.appUrl, threads - 1);
		const seconds = (performance.now() - start) / 1000;
		const { user, system } = process.cpuUsage(spent);
		const processorSeconds = (user + system) / 1e6;
		return {
			shipments,
			readings: report.readings,
			seconds,
			processorSeconds,
			threads,
			isSound: report.isSound
		};
	} finally {
		await server.stop();
		rmSync(folder, { recursive: true, force: true });
	}
}

/** Rows like those of the first shipment, which the factories make, each with a trace of its own. */
async function store(shipments: number, readingsEach: number): Promise<void> {
	const { product, spec } = await buildProduct();
	const user = await buildUser(['qa']);
	const first = await buildShipment({ product });
	const kept = await buildTrace(first.shipment, user, coldRoomTrace(2));
	const room = new SharedRoom();
	for (let at = 0; at < shipments; at += rowsAtOnce) {
		const batch = Array.from({ length: Math.min(rowsAtOnce, shipments - at) }, (_, i) =>
			rowsOf(at + i + 1, readingsEach, first, kept, spec, room)
		);
		await Shipment.bulkCreate(batch.map((rows) => rows.shipment));
		await ShipmentLine.bulkCreate(batch.map((rows) => rows.line));
		await LoggerRead.bulkCreate(batch.map((rows) => rows.read));
		await TraceRow.bulkCreate(batch.map((rows) => rows.trace));
		await AssessmentRow.bulkCreate(batch.map((rows) => rows.assessment));
	}
}

function rowsOf(
	seed: number,
	readingsEach: number,
	first: Awaited<ReturnType<typeof buildShipment>>,
	kept: Awaited<ReturnType<typeof buildTrace>>,
	spec: Awaited<ReturnType<typeof buildProduct>>['spec'],
	room: SharedRoom
) {
	const trace = coldRoomTrace(readingsEach, seed);
	const [shipmentId, lineId, readId, traceId] = [uuid(), uuid(), uuid(), uuid()];
	const packed = Buffer.from(packTrace(trace));
	const contentSha256 = sha256Hex(packed);
	const input = inputOf(trace, { kind: 'constant-q10', q10: 3 });
	const inputs: PinnedInputs = {
		engineVersion,
		specVersionId: spec.id,
		specSha256: spec.figuresSha256,
		traceSha256: contentSha256,
		fileSha256: contentSha256,
		layoutFingerprint: null,
		clockShiftMs: 0,
		accuracyCelsius: 0.5,
		placement: 'between-cases',
		opening: input.opening,
		handovers: [...input.handovers],
		trims: [],
		neededHours: 264
	};
	const assessment = assess(assessInputOf(inputs, JSON.parse(spec.figures), trace), room);
	const [line] = first.lines;
	if (!line) throw new Error('The first shipment has no line.');
	const { remainingHours } = assessment;
	return {
		shipment: { ...first.shipment.get(), id: shipmentId, number: `B-${seed}` },
		line: { ...line.get(), id: lineId, shipmentId },
		read: { ...kept.read.get(), id: readId, shipmentId, part: seed },
		trace: {
			...kept.row.get(),
			id: traceId,
			readId,
			shipmentId,
			readings: readingsEach,
			packed,
			contentSha256
		},
		assessment: {
			id: uuid(),
			shipmentId,
			lineId,
			traceId,
			specVersionId: spec.id,
			engineVersion,
			inputsSha256: inputsSha256(inputs),
			figures: figuresText(assessment, inputs, 0),
			remainingHours: remainingHours.value,
			remainingLowHours: remainingHours.low,
			remainingHighHours: remainingHours.high,
			neededHours: assessment.neededHours,
			isGoverning: true,
			isCurrent: true,
			madeAt: testNow
		}
	};
}
