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
	/** Covers the sample `cod-two-probes.csv`: 14 April 10:00 to 15 April 10:45 UTC; Amsterdam is two hours ahead. */
	departed: '2026-04-14T12:00',
	collected: '2026-04-14T18:00',
	due: '2026-04-15T11:30',
	arrived: '2026-04-15T12:20'
};
