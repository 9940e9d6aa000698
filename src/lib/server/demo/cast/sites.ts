import type { SiteForm } from '../../../schemas/site';

export type SiteKey = 'PS' | 'HM';

const week = (from: string, to: string) => {
	const hours = [from, to] as const;
	return { mon: hours, tue: hours, wed: hours, thu: hours, fri: hours, sat: hours, sun: hours };
};

/** Two docks in two zones, of which one reads °F. GLNs carry the sample prefix of GS1's own examples. */
export const sites: Record<SiteKey, SiteForm> = {
	PS: {
		code: 'PS',
		name: 'Pell Staithe',
		address: 'Quay 1, Pell Staithe, Netherlands',
		gln: '9506000050010',
		zone: 'Europe/Amsterdam',
		temperatureUnit: 'celsius',
		pageSize: 'a4',
		currency: 'EUR',
		opening: week('04:00', '22:00'),
		docks: ['Dock 1', 'Dock 2'],
		revision: ''
	},
	HM: {
		code: 'HM',
		name: 'Harrow Mill',
		address: '1 Mill Race Rd, Harrow Mill, United States',
		gln: '9506000050027',
		zone: 'America/New_York',
		temperatureUnit: 'fahrenheit',
		pageSize: 'letter',
		currency: 'USD',
		opening: week('02:00', '22:00'),
		docks: ['Door 1', 'Door 2', 'Door 3'],
		revision: ''
	}
};

export const organisationName = 'Pell Staithe';
