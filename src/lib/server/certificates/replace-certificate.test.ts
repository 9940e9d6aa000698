import { execFileSync } from 'node:child_process';
import { readFileSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { inFolder, pdfsig } from '../../../../tests/helpers/pdf-tools';
import { buildSite, buildUser, contextFor, testNow } from '../../../../tests/helpers/factories';
import { reportInput } from '../../../../tests/helpers/report-fixture';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { AuditEntry } from '../db/models/audit-entry';
import { Certificate } from '../db/models/certificate';
import { Job } from '../db/models/job';
import { User } from '../db/models/user';
import { env } from '../env';
import { systemContext, type Context } from '../context';
import { runDueJobs } from '../jobs/run-jobs';
import { registerAllJobs } from '../jobs/register-all';
import { sealedReport } from '../reports/pdf/sealed-report';
import { checkSeal } from '../reports/seal/check-seal';
import { listCertificates } from './list-certificates';
import { organisationCertificate } from './organisation-certificate';
import { replaceCertificate } from './replace-certificate';
import { warnOfEnd } from './warn-of-end';

useTestDatabase();

interface Wanted {
	/** Arguments of `openssl req -newkey`. */
	key?: string[];
	extensions?: string[];
	from?: string;
	until?: string;
	export?: string[];
}

const fit = ['basicConstraints=critical,CA:FALSE', 'keyUsage=critical,digitalSignature'];

/** A PKCS#12 store as another program makes it; every test of ours must stand on stores we did not make. */
function storeOf({
	key = ['rsa:2048'],
	extensions = fit,
	from,
	until,
	export: more = []
}: Wanted = {}): Uint8Array {
	return inFolder((folder) => {
		const at = (name: string) => join(folder, name);
		const openssl = (...args: string[]) => execFileSync('openssl', args, { stdio: 'pipe' });
		const files = ['-keyout', at('key'), '-out', at('csr'), '-subj', '/O=Pell Staithe/CN=Pell seal'];
		openssl('req', '-newkey', ...key, '-nodes', ...files);
		const lines = ['[ca]', 'default_ca=own', '[own]', 'default_md=sha256', 'policy=any', 'unique_subject=no',
			`new_certs_dir=${folder}`, `database=${at('index')}`, `serial=${at('serial')}`, 'x509_extensions=ext',
			'[any]', 'organizationName=optional', 'commonName=supplied', '[ext]', ...extensions]; // prettier-ignore
		execFileSync('tee', [at('ca.conf')], { input: `${lines.join('\n')}\n`, stdio: 'pipe' });
		execFileSync('tee', [at('index')], { input: '', stdio: 'pipe' });
		execFileSync('tee', [at('serial')], { input: '4711\n', stdio: 'pipe' });
		openssl('ca', '-batch', '-config', at('ca.conf'), '-selfsign', '-keyfile', at('key'), '-in', at('csr'),
			'-out', at('pem'), '-notext', '-startdate', from ?? '20260101000000Z', '-enddate', until ?? '20280101000000Z'); // prettier-ignore
		openssl(
			'pkcs12',
			'-export',
			'-inkey',
			at('key'),
			'-in',
			at('pem'),
			'-passout',
			'pass:wørd',
			'-out',
			at('p12'),
			...more
		);
		return readFileSync(at('p12'));
	});
}

let admin: Context;
beforeAll(async () => {
	const site = await buildSite();
	admin = await contextFor(await buildUser(['admin'], { sites: [site] }));
	await organisationCertificate(systemContext(testNow));
});

const refusalOf = (p12: Uint8Array, password = 'wørd') =>
	replaceCertificate(admin, { p12, password }).then(
		() => 'taken',
		(error: Error) => error.message
	);

describe('replacing the certificate', () => {
	it.each<[string, Wanted, RegExp]>([
		['has ended', { from: '20240101000000Z', until: '20260401000000Z' }, /has ended/u],
		['has not begun', { from: '20260501000000Z' }, /not valid yet/u],
		['has a key of 1024 bits', { key: ['rsa:1024'] }, /shorter than 2048/u],
		['has an elliptic key', { key: ['ec', '-pkeyopt', 'ec_paramgen_curve:P-256'] }, /not an RSA key/u],
		[
			'may only encipher',
			{ extensions: ['basicConstraints=CA:FALSE', 'keyUsage=keyEncipherment'] },
			/not for signing/u
		],
		['is for web servers', { extensions: [...fit, 'extendedKeyUsage=serverAuth'] }, /not for signing/u],
		['is an authority’s', { extensions: ['basicConstraints=critical,CA:TRUE'] }, /authority/u],
		['comes without its key', { export: ['-nokeys'] }, /no private key/u]
	])('is refused in words where it %s', async (_, wanted, why) => {
		const before = await Certificate.findAll({ raw: true });
		expect(await refusalOf(storeOf(wanted))).toMatch(why);
		expect(await Certificate.findAll({ raw: true })).toEqual(before);
	});

	it('is refused with a wrong password, with none, and where it is no such file', async () => {
		const p12 = storeOf();
		expect(await refusalOf(p12, 'guessed')).toMatch(/password does not open/u);
		expect(await refusalOf(p12, '')).toMatch(/password does not open/u);
		for (const bytes of [
			new Uint8Array(),
			Buffer.from('hello'),
			p12.subarray(0, 500),
			Buffer.from('0\u0003\u0002\u0001\u0001')
		])
			expect(await refusalOf(bytes)).toMatch(/not a PKCS#12/u);
	});

	it('is for admins', async () => {
		const qa = await contextFor(await buildUser(['qa'], { sites: [await buildSite()] }));
		await expect(replaceCertificate(qa, { p12: storeOf(), password: 'wørd' })).rejects.toMatchObject({
			code: 'not-allowed'
		});
		await expect(listCertificates(qa)).rejects.toMatchObject({ code: 'not-allowed' });
	});

	it('seals what comes next, and what was sealed before can still be checked', async () => {
		const old = await organisationCertificate(systemContext(testNow));
		const input = reportInput({}, 1);
		const before = await sealedReport({ input, ...old.key, timestampUrl: null });
		expect(await refusalOf(storeOf({ export: ['-legacy'] }))).toBe('taken');
		expect(await refusalOf(storeOf())).toBe('taken');
		const next = await organisationCertificate(systemContext(testNow));
		expect(next.row.subject).toContain('CN=Pell seal');
		const after = await sealedReport({ input, ...next.key, timestampUrl: null });
		expect(pdfsig(after.pdf)).toContain('Signature is Valid.');
		expect(pdfsig(after.pdf)).toContain('Pell seal');
		const known = new Set((await Certificate.findAll()).map(({ sha256 }) => sha256));
		for (const { pdf } of [before, after]) expect(checkSeal(pdf, known).fault).toBeNull();
		expect(checkSeal(before.pdf, known).certificateSha256).toBe(old.row.sha256);

		const { items } = await listCertificates(admin);
		expect(items.filter(({ retiredAt }) => retiredAt === null).map(({ sha256 }) => sha256)).toEqual([
			next.row.sha256
		]);
		expect(items.find(({ sha256 }) => sha256 === old.row.sha256)?.retiredAt).toBe(testNow.toISOString());
	});

	it('writes the change down, and the password nowhere', async () => {
		const entries = await AuditEntry.findAll({ where: { type: 'certificate.replaced' }, raw: true });
		expect(entries.length).toBeGreaterThan(0);
		const { keysFolder } = env();
		for (const name of readdirSync(keysFolder)) {
			expect(readFileSync(join(keysFolder, name)).includes(Buffer.from('wørd'))).toBe(false);
			expect(statSync(join(keysFolder, name)).mode & 0o077).toBe(0);
		}
		expect(JSON.stringify(entries)).not.toContain('wørd');
	});

	it('does not take the one that is in use, and takes an earlier one back', async () => {
		const first = storeOf();
		expect(await refusalOf(first)).toBe('taken');
		expect(await refusalOf(first)).toMatch(/in use already/u);
		expect(await refusalOf(storeOf())).toBe('taken');
		expect(await refusalOf(first)).toBe('taken');
		expect(await Certificate.count({ where: { retiredAt: null } })).toBe(1);
	});

	it('leaves one in use when two are uploaded at once', async () => {
		const both = [storeOf(), storeOf()].map((p12) => replaceCertificate(admin, { p12, password: 'wørd' }));
		await Promise.all(both);
		expect(await Certificate.count({ where: { retiredAt: null } })).toBe(1);
	});
});

describe('a certificate that ends', () => {
	it('is told to every admin once, sixty days ahead and not before', async () => {
		await User.update({ switchedOffAt: testNow }, { where: {} });
		const site = await buildSite();
		await buildUser(['admin'], { sites: [site] });
		await buildUser(['admin', 'qa'], { sites: [site] });
		await buildUser(['qa'], { sites: [site] });
		expect(await refusalOf(storeOf({ until: '20260701000000Z' }))).toBe('taken');
		const onDay = (day: string) => systemContext(new Date(`${day}T00:00:00Z`));
		expect(await warnOfEnd(onDay('2026-05-02'))).toBe(false);
		const told = await Promise.all([warnOfEnd(onDay('2026-05-03')), warnOfEnd(onDay('2026-05-03'))]);
		expect(told.toSorted()).toEqual([false, true]);
		expect(await warnOfEnd(onDay('2026-06-30'))).toBe(false);
		expect(await Job.count({ where: { kind: 'certificate-ending' } })).toBe(2);
		const { items } = await listCertificates({ ...admin, now: new Date('2026-05-03T00:00:00Z') });
		expect(items[0]).toMatchObject({ daysLeft: 59, isEnding: true });
	});

	it('is not told any more once it was replaced', async () => {
		expect(await refusalOf(storeOf())).toBe('taken');
		registerAllJobs();
		await Job.update({ runAt: new Date(0) }, { where: { kind: 'certificate-ending' } });
		await runDueJobs('test');
		// No mail server stands here: a mail would have failed.
		expect(await Job.count({ where: { kind: 'certificate-ending', doneAt: null } })).toBe(0);
	});
});
