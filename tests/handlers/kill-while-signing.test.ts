import { fork, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, readFileSync, readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { v7 as uuid } from 'uuid';
import { build } from 'vite';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { freePort } from '../../src/cli/setup/mariadb.mjs';
import { verifyAllChains } from '../../src/lib/server/audit/verify';
import { Arrival } from '../../src/lib/server/db/models/arrival';
import { AuditEntry } from '../../src/lib/server/db/models/audit-entry';
import { Disposition } from '../../src/lib/server/db/models/disposition';
import { DispositionLine } from '../../src/lib/server/db/models/disposition-line';
import { Job } from '../../src/lib/server/db/models/job';
import { Notice } from '../../src/lib/server/db/models/notice';
import type { Partner } from '../../src/lib/server/db/models/partner';
import type { Product } from '../../src/lib/server/db/models/product';
import { Report } from '../../src/lib/server/db/models/report';
import { Shipment } from '../../src/lib/server/db/models/shipment';
import type { Site } from '../../src/lib/server/db/models/site';
import type { User } from '../../src/lib/server/db/models/user';
import { evidenceSha256 } from '../../src/lib/server/dispositions/freeze';
import { signDisposition } from '../../src/lib/server/dispositions/sign-disposition';
import { getDocket } from '../../src/lib/server/dockets/get-docket';
import { registerAllJobs } from '../../src/lib/server/jobs/register-all';
import { runDueJobs } from '../../src/lib/server/jobs/run-jobs';
import { startMailbox } from '../../src/lib/server/mail/local-mailbox';
import {
	buildContact,
	buildPartner,
	buildProduct,
	buildShipment,
	buildSite,
	buildUser,
	contextFor,
	testNow,
	testPassword
} from '../helpers/factories';
import { startDatabaseProxy, type DatabaseProxy } from '../helpers/database-proxy';
import type { Order } from '../helpers/sign-child';
import { useTestDatabase } from '../helpers/test-database';

const { appUrl } = useTestDatabase();

const root = join(import.meta.dirname, '../..');
const programs = mkdtempSync(join(root, 'node_modules/.sign-child-'));
const mails = join(programs, 'mails');
const ends: (() => Promise<void>)[] = [];

let site: Site;
let supplier: Partner;
let product: Product;
let qa: User;
let proxy: DatabaseProxy;
let childEnv: NodeJS.ProcessEnv;

/** The child is the product's own code in one file, as the product's programs are built. */
async function bundleChild(): Promise<void> {
	await build({
		configFile: false,
		root,
		logLevel: 'error',
		publicDir: false,
		resolve: { alias: { $lib: join(root, 'src/lib') } },
		build: {
			ssr: true,
			target: 'node20',
			outDir: programs,
			emptyOutDir: false,
			rollupOptions: {
				input: { child: join(root, 'tests/helpers/sign-child.ts') },
				output: { entryFileNames: '[name].mjs' }
			}
		}
	});
}

beforeAll(async () => {
	const mailPort = await freePort();
	Object.assign(process.env, { SMTP_URL: `smtp://127.0.0.1:${mailPort}` });
	const mailbox = await startMailbox(mails, mailPort);
	proxy = await startDatabaseProxy(appUrl());
	ends.push(mailbox.stop, proxy.close);
	childEnv = { ...process.env, DATABASE_URL: proxy.url(appUrl()), NODE_ENV: 'production' };
	site = await buildSite();
	supplier = await buildPartner();
	await buildContact(supplier);
	({ product } = await buildProduct());
	qa = await buildUser(['qa'], { sites: [site] });
	await bundleChild();
	registerAllJobs();
}, 60_000);

afterAll(async () => {
	for (const { child } of waiting) child.kill('SIGKILL');
	for (const end of ends) await end();
	rmSync(programs, { recursive: true, force: true });
});

/** Children that have started and wait for an order: starting is most of what a child costs. */
const waiting: { child: ChildProcess; isReady: Promise<unknown> }[] = [];
const startAhead = 3;

async function freshChild(): Promise<ChildProcess> {
	while (waiting.length <= startAhead) {
		const child = fork(join(programs, 'child.mjs'), {
			cwd: root,
			env: childEnv,
			execArgv: [],
			stdio: ['ignore', 'ignore', 'inherit', 'ipc']
		});
		waiting.push({ child, isReady: once(child, 'message') });
	}
	const next = waiting.shift();
	if (!next) throw new Error('There is no child.');
	await next.isReady;
	return next.child;
}

async function kill(child: ChildProcess): Promise<void> {
	const gone = once(child, 'exit');
	child.kill('SIGKILL');
	await gone;
}

/** Gives an order and kills the child once the proxy has kept a statement back, or after a time, or when it is done. */
async function killedAt(order: Order, until: () => Promise<unknown>): Promise<'killed' | 'done'> {
	const child = await freshChild();
	const answered = once(child, 'message').then(([answer]) => {
		if (answer !== 'done') throw new Error(String(answer));
		return 'done' as const;
	});
	answered.catch(() => {});
	child.send(order);
	const how = await Promise.race([until().then(() => 'killed' as const), answered]);
	await kill(child);
	return how;
}

async function arrivedLoad(): Promise<{ shipment: Shipment; order: Extract<Order, { act: 'sign' }> }> {
	const { shipment, lines } = await buildShipment({ site, supplier, product, arrivedAt: testNow });
	await Arrival.create({
		id: uuid(),
		shipmentId: shipment.id,
		arrivedAt: testNow,
		isSealIntact: true,
		loggedBy: qa.id,
		loggedAt: testNow
	});
	const docket = await getDocket(await contextFor(qa), shipment.number);
	const input = {
		lines: lines.map(({ id }) => ({
			lineId: id,
			outcome: 'reject' as const,
			condition: null,
			reason: 'crushed'
		})),
		reasons: 'Half the cases are crushed.',
		meaning: 'approval' as const,
		password: testPassword,
		evidenceSha256: evidenceSha256(docket),
		amendmentReason: null,
		notify: true
	};
	return { shipment, order: { act: 'sign', number: shipment.number, userId: qa.id, input } };
}

/** How much of a signature a docket has, counted part by part. */
async function partsOf(shipmentId: string): Promise<Record<string, number>> {
	const dispositions = await Disposition.findAll({ where: { shipmentId }, attributes: ['id'] });
	const ids = dispositions.map(({ id }) => id);
	const notices = await Notice.findAll({ where: { shipmentId }, attributes: ['id'] });
	const entry = (type: string) => AuditEntry.count({ where: { chainId: shipmentId, type } });
	return {
		dispositions: ids.length,
		lines: await DispositionLine.count({ where: { dispositionId: ids } }),
		decided: (await Shipment.findByPk(shipmentId))?.decidedAt ? 1 : 0,
		signedEntries: await entry('disposition.signed'),
		reportJobs: await Job.count({ where: { dedupeKey: ids.map((id) => `report ${id}`) } }),
		notices: notices.length,
		noticeEntries: await entry('notice.queued'),
		noticeJobs: await Job.count({ where: { dedupeKey: notices.map(({ id }) => `notice ${id}`) } })
	};
}

async function expectNoneOrWhole(shipmentId: string): Promise<'none' | 'whole'> {
	const parts = await partsOf(shipmentId);
	const counts = new Set(Object.values(parts));
	expect(counts.size, JSON.stringify(parts)).toBe(1);
	const [count] = counts;
	expect([0, 1]).toContain(count);
	return count === 1 ? 'whole' : 'none';
}

/** What a restart would find: leases of the dead have run out. */
async function restart(): Promise<void> {
	await Job.update({ leasedUntil: new Date(0), runAt: testNow }, { where: { doneAt: null } });
	await runDueJobs('restarted');
}

const messageIdsOf = () =>
	readdirSync(mails)
		.filter((name) => name.endsWith('.eml'))
		.map((name) => /^Message-ID: (.+)$/im.exec(readFileSync(join(mails, name), 'utf8'))?.[1]?.trim());

async function expectFinished(shipmentId: string): Promise<void> {
	expect(await Report.count({ where: { shipmentId } })).toBe(1);
	const notice = await Notice.findOne({ where: { shipmentId }, rejectOnEmpty: true });
	expect(notice.state).toBe('sent');
	const entries = async (type: string) => AuditEntry.count({ where: { chainId: shipmentId, type } });
	expect([await entries('report.sealed'), await entries('notice.sent')]).toEqual([1, 1]);
	expect(messageIdsOf().filter((id) => id === notice.messageId)).toHaveLength(1);
}

const isWrite = (sql: string) => /^\s*(INSERT|UPDATE|DELETE|COMMIT)/i.test(sql);
const isNotPoll = (sql: string) => !/time_zone/.test(sql);

describe('a process that is killed with SIGKILL', { timeout: 240_000 }, () => {
	it('while it signs, between any two writes, leaves no signature or a whole one', async () => {
		const outcomes: string[] = [];
		// One more kill than there are writes: the last child is killed when it is done.
		for (let nth = 1; outcomes.at(-1) !== 'whole'; nth++) {
			const { shipment, order } = await arrivedLoad();
			let writes = 0;
			proxy.watch((sql) => isWrite(sql) && ++writes === nth);
			await killedAt(order, () => proxy.stopped());
			outcomes.push(await expectNoneOrWhole(shipment.id));
			expect(nth).toBeLessThan(60);
		}
		proxy.watch();
		// Every statement up to and with COMMIT was held back once: signing writes at least these parts.
		expect(outcomes.length).toBeGreaterThan(12);
		expect(outcomes.slice(0, -1).every((outcome) => outcome === 'none')).toBe(true);
	});

	it('at moments nobody chose leaves no signature or a whole one', async () => {
		proxy.watch();
		// A seeded sequence (Park and Miller, Communications of the ACM 31, 1988), so that a failure comes back.
		let seed = 20_261_201;
		for (let i = 0; i < 4; i++) {
			seed = (seed * 16_807) % 2_147_483_647;
			const { shipment, order } = await arrivedLoad();
			await killedAt(order, () => wait(seed % 400));
			await expectNoneOrWhole(shipment.id);
		}
	});

	it('while it makes the report or sends the notice leaves work that a restart ends, once', async () => {
		proxy.watch();
		await restart();
		const moments = [
			/INSERT INTO .reports/,
			/UPDATE .jobs. SET .*done_at/,
			/INSERT INTO .tokens/,
			/UPDATE .notices. SET/
		];
		for (const moment of moments) {
			const { shipment, order } = await arrivedLoad();
			await signDisposition(await contextFor(qa), order.number, order.input);
			proxy.watch((sql) => isNotPoll(sql) && moment.test(sql));
			expect(await killedAt({ act: 'work' }, () => proxy.stopped())).toBe('killed');
			await restart();
			await expectFinished(shipment.id);
		}
	});

	it('has left everything signed with one report and one notice, and every chain whole', async () => {
		proxy.watch();
		await restart();
		const signed = await Disposition.findAll({ attributes: ['shipmentId'] });
		expect(signed.length).toBeGreaterThan(0);
		for (const { shipmentId } of signed) await expectFinished(shipmentId);
		expect(await Job.count({ where: { doneAt: null } })).toBe(0);
		const { faults, unrecorded } = await verifyAllChains();
		expect([faults, unrecorded]).toEqual([[], []]);
	});
});
