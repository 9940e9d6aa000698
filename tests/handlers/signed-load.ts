import { logArrival } from '../../src/lib/server/arrivals/log-arrival';
import { arrivalInput } from '../../src/lib/schemas/arrival';
import type { User } from '../../src/lib/server/db/models/user';
import { NoteFile } from '../../src/lib/server/db/models/note-file';
import { receiveNote } from '../../src/lib/server/notes/receive-note';
import { addPhoto } from '../../src/lib/server/photos/add-photo';
import { photoInput } from '../../src/lib/schemas/photo';
import { samplePhoto } from '../../src/lib/server/photos/sample-photo';
import { reassess } from '../../src/lib/server/assessments/reassess';
import { inTransaction } from '../../src/lib/server/db/transaction';
import { buildPartner, buildShipment, buildSite, buildUser, contextFor, testNow } from '../helpers/factories';
import { multipart } from '../helpers/upload';
import { buildTrace, steadyTrace } from '../helpers/trace-factory';

/** A load that has arrived, with a photograph, a note with a letter and one kept read, and a person of every role who may see it. */
export async function buildSeenLoad() {
	const site = await buildSite();
	const supplier = await buildPartner();
	const stranger = await buildPartner();
	const people = {
		dock: await buildUser(['dock'], { sites: [site] }),
		qa: await buildUser(['qa'], { sites: [site] }),
		claims: await buildUser(['claims'], { sites: [site] }),
		admin: await buildUser(['admin'], { sites: [site] }),
		/** Of another site. */
		far: await buildUser(['qa'], { sites: [await buildSite()] }),
		supplier: await buildUser(['supplier'], { partner: supplier }),
		stranger: await buildUser(['supplier'], { partner: stranger })
	} satisfies Record<string, User>;
	const { shipment } = await buildShipment({ site, supplier });
	const dock = await contextFor(people.dock);
	const seen = arrivalInput.parse({ arrived: '2026-04-03T05:52', seal: 'as-on-papers' });
	await logArrival(dock, shipment.number, seen);
	const photo = await addPhoto(dock, shipment.number, photoInput.parse({ kind: 'load' }), samplePhoto);
	const note = multipart([{ name: 'letter.pdf', content: '%PDF-1.7' }], {
		text: 'Carrier was told at 06:40.'
	});
	await receiveNote(dock, shipment.number, await note);
	const noteFile = await NoteFile.findOne({ order: [['id', 'DESC']], rejectOnEmpty: true });
	const trace = steadyTrace(1.2, '2026-03-30T06:10:00Z', '2026-04-03T03:50:00Z');
	const { read, row } = await buildTrace(shipment, people.dock, trace);
	await inTransaction({ ...dock, now: testNow }, (w) => reassess(w, dock, shipment.id));
	return { shipment, people, photoId: photo.id, noteFileId: noteFile.id, readId: read.id, traceId: row.id };
}
