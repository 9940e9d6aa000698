import { Readable } from 'node:stream';
import { msPerMinute } from '../../../domain/units';
import { keepRead } from '../../reads/keep-read';
import { receiveUpload } from '../../reads/receive-upload';
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

/** Uploads an export as a browser would. @returns the read's id */
export async function upload(ctx: Context, number: string, file: ExportFile): Promise<string> {
	const form = new FormData();
	form.append('files', new File([file.text], file.name, { type: file.mediaType }));
	const sent = new Response(form);
	const answer = await receiveUpload(ctx, number, {
		body: Readable.from(Buffer.from(await sent.arrayBuffer())),
		contentType: sent.headers.get('content-type')
	});
	const read = answer.reads[0];
	if (!read) throw new Error(`The export ${file.name} of ${number} was not taken.`);
	return read.id;
}

/** Keeps a read for its logger on its line. */
export async function keep(ctx: Context, readId: string, ride: Ride, serial: string, lineId: string | null) {
	const { position, placement } = ride;
	await keepRead(ctx, readId, { serial, lineId, position, placement, accuracyCelsius: null });
}
