import { describe, expect, it } from 'vitest';
import { v7 as uuid } from 'uuid';
import { buildSite, buildUser, contextFor } from '../helpers/factories';
import { useTestDatabase } from '../helpers/test-database';
import type { Context } from '../../src/lib/server/context';

useTestDatabase();

interface Page {
	load?: (event: never) => unknown;
	actions?: Record<string, (event: never) => unknown>;
}

const id = uuid();
const pages: Record<
	string,
	{ page: () => Promise<Page>; params?: Record<string, string>; isAdminOnly?: boolean }
> = {
	partners: { page: () => import('../../src/routes/(app)/partners/+page.server') },
	'partners/new': {
		page: () => import('../../src/routes/(app)/partners/new/+page.server'),
		isAdminOnly: true
	},
	'partners/[partner]': {
		page: () => import('../../src/routes/(app)/partners/[partner=uuid]/+page.server'),
		params: { partner: id }
	},
	settings: { page: () => import('../../src/routes/(app)/settings/+page.server') },
	'settings/users': {
		page: () => import('../../src/routes/(app)/settings/users/+page.server'),
		isAdminOnly: true
	},
	'settings/users/new': {
		page: () => import('../../src/routes/(app)/settings/users/new/+page.server'),
		isAdminOnly: true
	},
	'settings/users/[user]': {
		page: () => import('../../src/routes/(app)/settings/users/[user=uuid]/+page.server'),
		params: { user: id },
		isAdminOnly: true
	},
	'settings/sites': {
		page: () => import('../../src/routes/(app)/settings/sites/+page.server'),
		isAdminOnly: true
	},
	'settings/sites/new': {
		page: () => import('../../src/routes/(app)/settings/sites/new/+page.server'),
		isAdminOnly: true
	},
	'settings/sites/[site]': {
		page: () => import('../../src/routes/(app)/settings/sites/[site=uuid]/+page.server'),
		params: { site: id },
		isAdminOnly: true
	},
	'settings/certificate': {
		page: () => import('../../src/routes/(app)/settings/certificate/+page.server'),
		isAdminOnly: true
	},
	'settings/loggers': { page: () => import('../../src/routes/(app)/settings/loggers/+page.server') },
	'settings/loggers/new': {
		page: () => import('../../src/routes/(app)/settings/loggers/new/+page.server'),
		isAdminOnly: true
	},
	'settings/loggers/[logger]': {
		page: () => import('../../src/routes/(app)/settings/loggers/[logger=uuid]/+page.server'),
		params: { logger: id }
	},
	record: { page: () => import('../../src/routes/(app)/record/+page.server'), isAdminOnly: true },
	mailbox: { page: () => import('../../src/routes/(app)/mailbox/+page.server') },
	'mailbox/[mail]': {
		page: () => import('../../src/routes/(app)/mailbox/[mail=uuid]/+page.server'),
		params: { mail: id }
	}
};

function event(
	context: Context | null,
	params: Record<string, string> = {},
	fields: Record<string, string> = {}
) {
	const url = new URL('http://localhost/here');
	const request = new Request(url, { method: 'POST', body: new URLSearchParams(fields) });
	return {
		locals: { context, requestId: 'r' },
		params,
		url,
		request,
		cookies: { get: () => undefined }
	} as never;
}

/** What a handler did: the status it refused, failed or redirected with; 200 where it answered. */
async function statusOf(work: () => unknown): Promise<number> {
	try {
		const answer = await work();
		return typeof answer === 'object' && answer !== null && 'status' in answer ? Number(answer.status) : 200;
	} catch (thrown) {
		if (typeof thrown === 'object' && thrown !== null && 'status' in thrown) return Number(thrown.status);
		throw thrown;
	}
}

describe.each(Object.entries(pages))('%s', (_, { page, params, isAdminOnly }) => {
	it('answers nobody without a session, neither its load nor any of its actions', async () => {
		const { load, actions = {} } = await page();
		expect(await statusOf(() => load?.(event(null, params)))).toBe(401);
		for (const action of Object.values(actions))
			expect(await statusOf(() => action(event(null, params)))).toBe(401);
	});

	it('opens to the roles it is for', async () => {
		const dock = await contextFor(await buildUser(['dock'], { sites: [await buildSite()] }));
		const { load } = await page();
		const status = await statusOf(() => load?.(event(dock, params)));
		// A page of one record answers 404 here, since none has this id; that is past the question of the role.
		expect(status).toBe(isAdminOnly ? 403 : params ? 404 : 200);
	});
});

describe('a wrong role', () => {
	it('changes nothing by an action, however well the form is filled in', async () => {
		const site = await buildSite();
		const dock = await contextFor(await buildUser(['dock'], { sites: [site] }));
		const filled: [string, string, Record<string, string>][] = [
			['partners/new', 'save', { name: 'A', isSupplier: 'on' }],
			['partners/[partner]', 'save', { name: 'A', isSupplier: 'on' }],
			['partners/[partner]', 'switchOff', {}],
			['partners/[partner]', 'saveContact', { name: 'A', email: 'a@b.example', duty: 'quality' }],
			['partners/[partner]', 'switchContactOff', { contactId: id }],
			['settings/users/new', 'invite', { email: 'a@b.example', name: 'A', roles: 'dock', siteIds: site.id }],
			['settings/users/[user]', 'save', { name: 'A', roles: 'admin', siteIds: site.id }],
			['settings/users/[user]', 'switchOff', {}],
			['settings/users/[user]', 'unlock', {}],
			['settings/users/[user]', 'resend', {}],
			['settings/sites/[site]', 'switchOff', {}],
			['settings/sites/[site]', 'addHoliday', { heldOn: '2026-12-25', name: 'A' }],
			[
				'settings/loggers/new',
				'save',
				{ serial: 'A', kind: 'reusable', accuracyCelsius: '0.5', startDelayMinutes: '0' }
			],
			['settings/loggers/[logger]', 'switchOff', {}]
		];
		for (const [name, act, fields] of filled) {
			const entry = pages[name];
			const { actions } = entry ? await entry.page() : {};
			const action = actions?.[act];
			expect(action, `${name} ${act}`).toBeDefined();
			expect(await statusOf(() => action?.(event(dock, entry?.params, fields))), `${name} ${act}`).toBe(403);
		}
	});
});
