import { v7 as uuid } from 'uuid';
import { msPerMinute } from '../../../domain/units';
import { keepRead } from '../../reads/keep-read';
import { getShipmentFor } from '../../reads/find-read';
import { readBytes } from '../../reads/read-bytes';
import { readContextOf } from '../../reads/read-context';
import { writeReceived } from '../../reads/write-received';
import { keepBytes } from '../../storage/store';
import type { Context } from '../../context';
import { exportOf, type ExportFile } from '../journeys/exports';
import type { LayoutName, Ride } from '../journeys/journey';
import { temperaturesOf } from '../journeys/temperatures';
import { chanceOf } from '../chance';
import type { Staged } from './staged';

/** What the loggers rode through: to the door, or on into the store. */
function courseOf({ plan, lane, legs, arrivedMs }: Staged) {
	const { intoStore, incidents = [] } = plan;
	if (!intoStore) return { legs, arrivedMs, incidents };
	const dock = {
		...{ by: lane.carrier, place: 'dock', hours: 0, setPointCelsius: intoStore.dockCelsius },
		...{ plannedMs: arrivedMs, actualMs: arrivedMs }
	};
	return { legs: [...legs, dock], arrivedMs: arrivedMs + intoStore.minutes * msPerMinute, incidents };
}

/** The export of one logger of a load. */
export function exportOfRide(staged: Staged, ride: Ride, serial: string, layout: LayoutName): ExportFile {
	const { plan, zone } = staged;
	const course = courseOf(staged);
	const written = temperaturesOf(course, ride, chanceOf(`${plan.key} ${ride.line} ${ride.position}`));
	return exportOf(layout, { serial, trip: staged.goods[0]?.description ?? '', zone, written });
}

/**
 * Uploads an export: kept, read and noted as any upload is, but read in place. It is of our own making, and a thread
 * for each of sixty costs as much time as all the rest of the demo. @returns the read's id
 */
export async function upload(ctx: Context, number: string, file: ExportFile): Promise<string> {
	const bytes = new TextEncoder().encode(file.text);
	const shipment = await getShipmentFor(ctx, number, 'read.upload');
	const kept = await keepBytes(bytes, file.mediaType, ctx.now);
	const context = await readContextOf(shipment, ctx.now, {});
	const { summary } = readBytes({ bytes, context, withTraces: false });
	const { read } = await writeReceived(ctx, shipment.id, {
		...{ id: uuid(), fileId: kept.id, fileName: file.name, fileSha256: kept.sha256, fileBytes: kept.bytes },
		...{ summary, layoutId: null }
	});
	return read.id;
}

/** Keeps a read for its logger on its line. */
export async function keep(ctx: Context, readId: string, ride: Ride, serial: string, lineId: string | null) {
	const { position, placement } = ride;
	await keepRead(ctx, readId, { serial, lineId, position, placement, accuracyCelsius: null });
}
