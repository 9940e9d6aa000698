import { DateTime } from 'luxon';

const zone = 'Europe/Amsterdam';
const base = DateTime.now().setZone(zone).startOf('minute');

/** As a clock field takes it, by the clock of Pell Staithe. */
export function clockAt(at: DateTime): string {
	return at.setZone(zone).toFormat("yyyy-MM-dd'T'HH:mm");
}

/** What the walk enters and looks for again; new at every run, so that a run may follow another on one database. */
const mark = Date.now().toString(36).slice(-6);

export const story = {
	mark,
	guest: {
		name: 'Wil Tarring',
		email: `wil.${mark}@wharfinger.example`,
		password: 'a long enough pass phrase'
	},
	supplier: { name: `Orrin Bay Fish ${mark}`, contact: 'Bea Orrin', email: `quality@orrin-${mark}.example` },
	carrier: 'Bexcombe Haulage',
	product: `Whiting, gutted ${mark}`,
	logger: `WT-${mark}`,
	lot: `OB-${mark}`,
	bill: `BL-${mark}`,
	seal: `S${mark}`,
	departed: clockAt(base.minus({ hours: 26 })),
	collected: clockAt(base.minus({ hours: 20 })),
	due: clockAt(base.minus({ minutes: 30 })),
	/** The last reading of the export; the others lie a day before it. */
	lastReadingAt: base.minus({ minutes: 45 })
};
