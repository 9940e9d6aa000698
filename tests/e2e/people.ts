import { test as base, expect, type Browser, type BrowserContextOptions, type Page } from '@playwright/test';

/** The password of the demo's people. */
export const demoPassword = 'wharfinger-demo';

export type Person = 'dock' | 'qa' | 'claims' | 'admin';
type Session = Awaited<ReturnType<Awaited<ReturnType<Browser['newContext']>>['storageState']>>;

/** Signs in through the page, as a person does. */
export async function signIn(page: Page, email: string, password = demoPassword): Promise<void> {
	await page.goto('/sign-in');
	const form = page.locator('form', { has: page.getByRole('button', { name: 'Sign in', exact: true }) });
	await form.getByLabel('E-mail').fill(email);
	await form.getByLabel('Password').fill(password);
	await form.getByRole('button', { name: 'Sign in', exact: true }).click();
	await expect(page).not.toHaveURL(/sign-in/);
}

/** Chooses where somebody of several sites works now. */
export async function workAt(page: Page, site: string): Promise<void> {
	await page.goto('/settings');
	await page.getByRole('radio', { name: site }).check();
	await page.getByRole('button', { name: 'Work there' }).click();
	await expect(page.getByRole('region', { name: /Where you work now$/ })).toContainText(site);
	await expect(page.getByText('Site chosen.')).toBeVisible();
}

/** What a browser must never say on our pages. */
export interface Complaints {
	readonly all: string[];
}

/** Listens for console errors, uncaught errors and failed requests of a page. */
export function complaintsOf(page: Page): Complaints {
	const all: string[] = [];
	page.on('console', (message) => {
		if (message.type() === 'error') all.push(`${page.url()} console: ${message.text()}`);
	});
	page.on('pageerror', (error) => all.push(`${page.url()} uncaught: ${error.message}`));
	page.on('requestfailed', (request) => {
		const why = request.failure()?.errorText ?? '';
		// A page that is left takes its open requests with it; a download takes its navigation.
		if (why !== 'net::ERR_ABORTED') all.push(`${page.url()} request: ${request.url()} ${why}`);
	});
	page.on('response', (response) => {
		if (response.status() >= 500) all.push(`${page.url()} answer: ${response.url()} ${response.status()}`);
	});
	return { all };
}

interface Sessions {
	/** One sign-in a person and worker; tests borrow its cookies, so that the rate limit is not met. */
	sessionOf: (person: Person) => Promise<Session>;
}

interface Rooms {
	/** A page of a browser of its own, in which that person is signed in; null: nobody. */
	pageOf: (person: Person | null, options?: BrowserContextOptions) => Promise<Page>;
}

export const test = base.extend<Rooms, Sessions>({
	sessionOf: [
		async ({ browser }, use, worker) => {
			const sessions = new Map<Person, Promise<Session>>();
			const open = async (person: Person) => {
				const context = await browser.newContext({ baseURL: worker.project.use.baseURL });
				const page = await context.newPage();
				await signIn(page, `${person}@wharfinger.example`);
				await workAt(page, 'Pell Staithe');
				const session = await context.storageState();
				await context.close();
				return session;
			};
			await use((person) => {
				const session = sessions.get(person) ?? open(person);
				sessions.set(person, session);
				return session;
			});
		},
		{ scope: 'worker' }
	],
	pageOf: async ({ browser, sessionOf }, use) => {
		const opened: Page[] = [];
		await use(async (person, options = {}) => {
			const storageState = person ? await sessionOf(person) : undefined;
			const page = await (await browser.newContext({ storageState, ...options })).newPage();
			opened.push(page);
			return page;
		});
		for (const page of opened) await page.context().close();
	}
});

/** A phone at the dock. */
export const phone = { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true } as const;

export { expect };
