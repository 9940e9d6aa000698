import { createHash } from 'node:crypto';
import { strFromU8, unzipSync } from 'fflate';
import { z } from 'zod';
import { pdfsig } from '../helpers/pdf-tools';
import { enterLogger, enterProduct, enterSupplier } from './enter-catalogue';
import { openDocket } from './enter-papers';
import { importPapers } from './import-papers';
import { story } from './load-story';
import { logArrival } from './log-arrival';
import { linkInMail, openMail } from './mailbox';
import { complaintsOf, expect, phone, signIn, test } from './people';
import { reviewTrace } from './review-trace';
import { downloaded, rejectAndSign } from './sign-docket';
import { uploadAgain, uploadAndKeep } from './upload-export';

test.describe.configure({ mode: 'serial' });

const manifestSchema = z.object({
	docket: z.string(),
	files: z.array(z.object({ file: z.string(), what: z.string(), sha256: z.string() })).min(4)
});

/** Number of the docket the story is about, once it is opened. */
let docket = '';
/** Address in the notice. */
let link = '';

test('an admin invites somebody, who sets a password and is in', async ({ page, browser }) => {
	const complaints = complaintsOf(page);
	await signIn(page, 'admin@wharfinger.example');
	await page.goto('/settings/users/new');
	await page.getByLabel('E-mail').fill(story.guest.email);
	await page.getByLabel('Name').fill(story.guest.name);
	await page.getByRole('checkbox', { name: /^Dock/ }).check();
	await page.getByRole('checkbox', { name: 'Pell Staithe' }).check();
	await page.getByRole('button', { name: 'Send invitation' }).click();
	await expect(page.getByRole('heading', { level: 1, name: story.guest.name })).toBeVisible();

	await openMail(page, story.guest.email);
	const invitation = await linkInMail(page, '/invitation/');
	const guest = await (await browser.newContext()).newPage();
	await guest.goto(invitation);
	await guest.getByLabel('Password', { exact: true }).fill(story.guest.password);
	await guest.getByLabel('The same once more').fill(story.guest.password);
	await guest.getByRole('button', { name: 'Set password and sign in' }).click();
	await expect(guest).toHaveURL(/\/arrivals/);
	await guest.goto(invitation);
	await expect(guest.getByRole('heading', { name: 'This invitation no longer works' })).toBeVisible();
	await guest.context().close();
	expect(complaints.all).toEqual([]);
});

test('the admin enters a supplier with a contact, a logger, and a product with a signed spec', async ({
	pageOf
}) => {
	const page = await pageOf('admin');
	const complaints = complaintsOf(page);
	await enterSupplier(page);
	await enterLogger(page);
	await enterProduct(page);
	expect(complaints.all).toEqual([]);
});

test('the dock opens a docket from its papers, and others from a file', async ({ pageOf }) => {
	const page = await pageOf('dock');
	const complaints = complaintsOf(page);
	docket = await openDocket(page);
	await expect(page.getByText(story.supplier.name).first()).toBeVisible();
	await importPapers(page);
	expect(complaints.all).toEqual([]);
});

test('the dock logs the arrival on a phone, and keeps what the logger wrote', async ({ pageOf }) => {
	const page = await pageOf('dock', phone);
	const complaints = complaintsOf(page);
	await logArrival(page, docket);
	await uploadAndKeep(page, docket);
	await uploadAgain(page, docket);
	await page.goto(`/shipments/${docket}`);
	await expect(page.getByText('118').first()).toBeVisible();
	await expect(page.getByRole('main')).toContainText(/3\.3\s°C/);
	await expect(page.getByRole('img', { name: 'load' })).toHaveCount(1);
	expect(complaints.all).toEqual([]);
});

test('QA signs the refusal; a wrong password signs nothing', async ({ pageOf }) => {
	const page = await pageOf('qa');
	const complaints = complaintsOf(page);
	await page.goto(`/shipments/${docket}`);
	await expect(page.locator('#trace canvas').first()).toBeVisible();
	await expect(page.locator('#excursions').getByRole('row', { name: /^E1 / })).toContainText('too warm');
	await expect(
		page.locator('#legs').getByRole('row', { name: new RegExp(story.supplier.name) })
	).toBeVisible();

	await reviewTrace(page, 100);
	await rejectAndSign(page, docket);
	const signature = page.locator('#signature');
	await expect(signature).toContainText('Ruth Calloway');
	await expect(signature).toContainText('Approval');
	await expect(signature).toContainText(/\d{2}:\d{2}:\d{2}/);
	await expect(signature).toContainText(/CES?T, \+0[12]:00/);
	await expect(signature).toContainText('Version 1, current');
	expect(complaints.all).toEqual([]);
});

test('the report is sealed: pdfsig calls it valid, and a changed byte breaks it', async ({ pageOf }) => {
	const page = await pageOf('qa');
	const report = page.locator('#signature').getByRole('link', { name: /\.pdf$/ });
	await expect(async () => {
		await page.goto(`/shipments/${docket}`);
		await expect(report).toBeVisible({ timeout: 500 });
	}).toPass();
	const { bytes } = await downloaded(page, () => report.click());
	expect(pdfsig(bytes)).toContain('Signature is Valid');

	const forged = Buffer.from(bytes);
	const at = forged.indexOf('/Title');
	expect(at).toBeGreaterThan(0);
	forged.writeUInt8(forged.readUInt8(at + 8) ^ 1, at + 8);
	expect(pdfsig(forged)).not.toContain('Signature is Valid');
});

test('the notice comes by mail, and looking at its link does not use it up', async ({ pageOf }) => {
	const page = await pageOf('claims');
	await openMail(page, story.supplier.email);
	await expect(page.getByRole('heading', { level: 1 })).toContainText(docket);
	await expect(page.getByText(/^receiving-report.*\.pdf|\.pdf, /i).first()).toBeVisible();
	link = await linkInMail(page, '/link/');

	const looker = await pageOf(null);
	await looker.goto(link);
	await expect(looker.getByRole('heading', { name: `See docket ${docket}` })).toBeVisible();
	await looker.goto('/loads');
	await expect(looker).toHaveURL(/sign-in/);
});

test('the supplier opens the link, sees its docket, and disputes', async ({ pageOf }) => {
	const page = await pageOf(null);
	const complaints = complaintsOf(page);
	await page.goto(link, { waitUntil: 'networkidle' });
	await page.getByRole('button', { name: 'Open the docket' }).click();
	await expect(page.getByRole('heading', { name: 'Goods of your load were refused' })).toBeVisible();
	await expect(page.getByText(story.lot).first()).toBeVisible();
	await expect(page.locator('body')).not.toContainText(story.carrier);

	await page.getByRole('radio', { name: 'We dispute these' }).check();
	await page.getByRole('checkbox', { name: 'E1' }).check();
	await page.getByLabel('What is wrong, and what shows it').fill('Our own logger read 1.1 °C throughout.');
	await page.getByRole('button', { name: 'Send the answer' }).click();
	await expect(page.locator('#answer')).toContainText('Disputed: E1');
	expect(complaints.all).toEqual([]);

	const second = await pageOf(null);
	await second.goto(link);
	await expect(second.getByRole('heading', { name: 'This link no longer works' })).toBeVisible();
	await second.getByRole('button', { name: 'Mail a fresh one' }).click();
	await expect(second.getByRole('heading', { name: 'A fresh link is on its way' })).toBeVisible();
});

test('the claims desk opens a claim and takes the bundle, whose hashes hold', async ({ pageOf }) => {
	const page = await pageOf('claims');
	const complaints = complaintsOf(page);
	await page.goto(`/claims?q=${docket}`);
	const row = page.getByRole('row').filter({ hasText: docket });
	await row.getByRole('button', { name: 'Open a claim' }).click();
	await expect(page.getByLabel('Amount')).toBeVisible();
	await page.getByLabel('Against', { exact: true }).selectOption({ label: story.carrier });
	await page.getByLabel('Amount').fill('4720.50');
	await page.getByLabel('Status', { exact: true }).selectOption({ label: 'Filed' });
	await page.getByLabel('What it rests on').fill('Warm in the carrier’s hands; invoice value.');
	await page.getByRole('button', { name: 'Save the claim' }).click();
	const counterfoil = page.getByRole('complementary');
	await expect(counterfoil).toContainText(`against ${story.carrier}`);
	await expect(counterfoil).toContainText('4,720.50');

	const { name, bytes } = await downloaded(page, () =>
		page.getByRole('link', { name: 'Take the evidence bundle' }).click()
	);
	expect(name).toMatch(/\.zip$/);
	const files = unzipSync(bytes);
	const manifest = manifestSchema.parse(JSON.parse(strFromU8(files['manifest.json'] ?? new Uint8Array())));
	expect(manifest.docket).toBe(docket);
	expect(manifest.files.map(({ what }) => what)).toEqual(
		expect.arrayContaining([
			'Readings as CSV',
			expect.stringMatching(/report/i),
			expect.stringMatching(/export/i)
		])
	);
	for (const { file, sha256 } of manifest.files)
		expect(
			createHash('sha256')
				.update(files[file] ?? '')
				.digest('hex'),
			file
		).toBe(sha256);
	const named = [...manifest.files.map(({ file }) => file), 'manifest.json', 'SHA256SUMS'];
	expect(Object.keys(files).sort()).toEqual(named.sort());
	expect(complaints.all).toEqual([]);
});
