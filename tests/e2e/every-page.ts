import type { Page } from '@playwright/test';
import { complaintsOf, expect, test as base, type Complaints, type Person } from './people';
import { signInSupplier } from './supplier-room';

/** Addresses of records of the demo, found in its lists. */
export interface Found {
	/** Arrived, read, not decided. */
	atQa: string;
	/** Refused and signed. */
	signed: string;
	expected: string;
	/** Arrived, with an export that asks a question. */
	asking: string;
	question: string;
	kept: string;
	partner: string;
	product: string;
	site: string;
	logger: string;
	lane: string;
	user: string;
	mail: string;
	claim: string;
	load: string;
}

/** A page, as whom it is looked at, and where it is. */
export interface Place {
	readonly name: string;
	readonly as: Person | 'supplier' | null;
	readonly path: string | ((found: Found) => string);
}

const docketOf = (rest: string, which: 'atQa' | 'signed' | 'expected' | 'asking') => (found: Found) =>
	`/shipments/${found[which]}${rest}`;

export const places: readonly Place[] = [
	{ name: 'sign-in', as: null, path: '/sign-in' },
	{ name: 'a link that is not known', as: null, path: '/link/not-a-secret' },
	{ name: 'an invitation that no longer works', as: null, path: '/invitation/not-a-secret' },
	{ name: 'checking a report', as: null, path: '/verify' },
	{ name: 'a report nobody has sealed', as: null, path: '/verify/0000000000000000' },
	{ name: 'parts', as: null, path: '/parts' },
	{ name: 'arrivals', as: 'dock', path: '/arrivals' },
	{ name: 'arrivals to log', as: 'dock', path: '/arrivals/log' },
	{ name: 'dockets', as: 'qa', path: '/shipments' },
	{ name: 'dockets that wait for QA', as: 'qa', path: '/shipments/waiting' },
	{ name: 'a new docket', as: 'dock', path: '/shipments/new' },
	{ name: 'dockets from a file', as: 'dock', path: '/shipments/import' },
	{ name: 'a docket at QA', as: 'qa', path: docketOf('', 'atQa') },
	{ name: 'a signed docket', as: 'claims', path: docketOf('', 'signed') },
	{ name: 'an expected docket', as: 'dock', path: docketOf('', 'expected') },
	{ name: 'papers of a docket', as: 'dock', path: docketOf('/edit', 'expected') },
	{ name: 'logging an arrival', as: 'dock', path: docketOf('/arrival', 'expected') },
	{ name: 'reads', as: 'dock', path: docketOf('/reads', 'atQa') },
	{ name: 'a question about a file', as: 'dock', path: ({ question }) => question },
	{ name: 'a kept read', as: 'qa', path: ({ kept }) => kept },
	{ name: 'signing', as: 'qa', path: docketOf('/sign', 'atQa') },
	{ name: 'claims', as: 'claims', path: '/claims' },
	{ name: 'a claim', as: 'claims', path: ({ claim }) => claim },
	{ name: 'specs', as: 'admin', path: '/specs' },
	{ name: 'a spec', as: 'admin', path: ({ product }) => product },
	{ name: 'a version tried on past loads', as: 'admin', path: ({ product }) => `${product}/try?version=1` },
	{ name: 'a new product', as: 'admin', path: '/specs/new' },
	{ name: 'the library of starting specs', as: 'admin', path: '/specs/library' },
	{ name: 'a starting spec', as: 'admin', path: '/specs/library/broccoli-frozen' },
	{ name: 'partners', as: 'admin', path: '/partners' },
	{ name: 'a partner', as: 'admin', path: ({ partner }) => partner },
	{ name: 'a new partner', as: 'admin', path: '/partners/new' },
	{ name: 'the record', as: 'qa', path: '/record' },
	{ name: 'own settings', as: 'dock', path: '/settings' },
	{ name: 'API tokens', as: 'qa', path: '/settings/tokens' },
	{ name: 'sites', as: 'admin', path: '/settings/sites' },
	{ name: 'a site', as: 'admin', path: ({ site }) => site },
	{ name: 'a new site', as: 'admin', path: '/settings/sites/new' },
	{ name: 'loggers', as: 'admin', path: '/settings/loggers' },
	{ name: 'remembered layouts', as: 'qa', path: '/settings/layouts' },
	{ name: 'a logger', as: 'admin', path: ({ logger }) => logger },
	{ name: 'a new logger', as: 'admin', path: '/settings/loggers/new' },
	{ name: 'lanes', as: 'admin', path: '/settings/lanes' },
	{ name: 'a lane', as: 'admin', path: ({ lane }) => lane },
	{ name: 'a new lane', as: 'admin', path: '/settings/lanes/new' },
	{ name: 'the certificate', as: 'admin', path: '/settings/certificate' },
	{ name: 'retention', as: 'admin', path: '/settings/retention' },
	{ name: 'rules of signing', as: 'admin', path: '/settings/signing' },
	{ name: 'users', as: 'admin', path: '/settings/users' },
	{ name: 'a user', as: 'admin', path: ({ user }) => user },
	{ name: 'inviting somebody', as: 'admin', path: '/settings/users/new' },
	{ name: 'finding', as: 'qa', path: '/find?q=berries' },
	{ name: 'the mailbox', as: 'claims', path: '/mailbox' },
	{ name: 'a mail', as: 'claims', path: ({ mail }) => mail },
	{ name: 'loads of a supplier', as: 'supplier', path: '/loads' },
	{ name: 'a load of a supplier', as: 'supplier', path: ({ load }) => load }
];

interface Row {
	number: string;
	title: string;
	verdict: string | null;
}

async function docket(page: Page, query: string, fits: (row: Row) => boolean = () => true): Promise<string> {
	const answer = await page.request.get(`/api/v1/shipments?${query}`);
	expect(answer.status()).toBe(200);
	const { items }: { items: Row[] } = await answer.json();
	const number = items.find(fits)?.number;
	if (!number) throw new Error(`The demo has no docket for ${query}.`);
	return number;
}

/** Where the first link of a page leads that goes to a single record. */
async function firstOf(page: Page, list: string, link: RegExp): Promise<string> {
	await page.goto(list);
	const hrefs = await page.locator('main a').evaluateAll((all) => all.map((one) => one.getAttribute('href')));
	const href = hrefs.find((one) => one !== null && link.test(one));
	if (!href) throw new Error(`${list} has no link like ${link}.`);
	return href;
}

async function find(admin: Page, qa: Page, supplier: Page): Promise<Found> {
	const single = (base: string) => new RegExp(`^${base}/[0-9a-f-]{36}$`);
	const dockets = {
		atQa: await docket(qa, 'q=Blueberries+for+the+weekend'),
		signed: await docket(qa, 'stage=done', ({ verdict }) => verdict === 'rejected'),
		expected: await docket(qa, 'stage=expected'),
		asking: await docket(qa, 'stage=at-the-door', ({ title }) => /lettuce/i.test(title))
	};
	await signInSupplier(admin, supplier, 'Olmarisa Berry Growers');
	return {
		...dockets,
		question: await firstOf(qa, `/shipments/${dockets.asking}/reads`, /\/reads\/[0-9a-f-]{36}$/),
		kept: await firstOf(qa, `/shipments/${dockets.atQa}/reads`, /\/reads\/[0-9a-f-]{36}$/),
		partner: await firstOf(admin, '/partners', single('/partners')),
		product: await firstOf(admin, '/specs', single('/specs')),
		site: await firstOf(admin, '/settings/sites', single('/settings/sites')),
		logger: await firstOf(admin, '/settings/loggers', single('/settings/loggers')),
		lane: await firstOf(admin, '/settings/lanes', single('/settings/lanes')),
		user: await firstOf(admin, '/settings/users', single('/settings/users')),
		mail: await firstOf(admin, '/mailbox', single('/mailbox')),
		claim: await firstOf(qa, '/claims', single('/claims')),
		load: await firstOf(supplier, '/loads', single('/loads'))
	};
}

/** A page that is led from place to place, and what its browser has complained of at the present one. */
interface Tour {
	page: Page;
	complaints: Complaints;
}

interface Worker {
	/** One page a person and worker: opening a window takes longer than looking at most pages. */
	tourOf: (as: Place['as']) => Promise<Tour>;
	found: Found & { supplierSession: Awaited<ReturnType<ReturnType<Page['context']>['storageState']>> };
}

export const test = base.extend<object, Worker>({
	tourOf: [
		async ({ browser, sessionOf, found }, use, worker) => {
			const { baseURL, locale } = worker.project.use;
			const tours = new Map<Place['as'], Promise<Tour>>();
			const open = async (as: Place['as']): Promise<Tour> => {
				const storageState =
					as === null ? undefined : as === 'supplier' ? found.supplierSession : await sessionOf(as);
				const page = await (await browser.newContext({ baseURL, locale, storageState })).newPage();
				return { page, complaints: complaintsOf(page) };
			};
			await use(async (as) => {
				const tour = tours.get(as) ?? open(as);
				tours.set(as, tour);
				const { complaints } = await tour;
				complaints.all.length = 0;
				return tour;
			});
			for (const tour of tours.values()) await (await tour).page.context().close();
		},
		{ scope: 'worker' }
	],
	found: [
		async ({ browser, sessionOf }, use, worker) => {
			const { baseURL } = worker.project.use;
			const open = async (person: Person | null) =>
				(
					await browser.newContext({
						baseURL,
						storageState: person ? await sessionOf(person) : undefined
					})
				).newPage();
			const pages = [await open('admin'), await open('qa'), await open(null)] as const;
			const found = await find(...pages);
			const supplierSession = await pages[2].context().storageState();
			for (const page of pages) await page.context().close();
			await use({ ...found, supplierSession });
		},
		{ scope: 'worker', timeout: 110_000 }
	]
});
