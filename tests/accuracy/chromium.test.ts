import { chromium, type Browser, type Page } from '@playwright/test';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { build } from 'vite';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Answers, ReadContext } from '../../src/lib/domain/ingest/ingestion';
import { readExport } from '../../src/lib/domain/ingest/read-export';
import { mutated } from '../fuzz/mutate';
import { sampleFiles } from '../fuzz/run-fuzz';
import type { Offered } from './chromium-entry';
import { readAndAssess } from './read-and-assess';

/*
 * The dock's phone reads and assesses a file before it is sent, by the code that the server runs. Here both engines
 * read the same bytes, and what they say must be the same text, every digit of every number in it.
 */
const folder = 'sample-uploads';
const names = readdirSync(folder, { withFileTypes: true })
	.filter((entry) => entry.isFile() && entry.name !== 'README.md')
	.map(({ name }) => name);

function contextOf(answers: Answers = {}): ReadContext {
	return {
		uploadedMs: Date.UTC(2026, 3, 20, 12),
		siteZone: 'Europe/Amsterdam',
		journeyFromMs: Date.UTC(2026, 3, 10),
		journeyToMs: Date.UTC(2026, 3, 18),
		answers
	};
}

let browser: Browser;
let page: Page;

/** The reader as the client's build makes it: one script, the browser's side of every package. */
async function script(): Promise<string> {
	const built = await build({
		configFile: false,
		logLevel: 'error',
		build: {
			write: false,
			minify: true,
			lib: { entry: join(import.meta.dirname, 'chromium-entry.ts'), name: 'entry', formats: ['iife'] }
		}
	});
	const [bundle] = Array.isArray(built) ? built : [built];
	const chunk = bundle && 'output' in bundle ? bundle.output[0] : undefined;
	if (chunk?.type !== 'chunk') throw new Error('The build gave no script.');
	return chunk.code;
}

beforeAll(async () => {
	browser = await chromium.launch({
		executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium',
		args: ['--no-sandbox', '--disable-gpu', '--no-first-run', '--disable-background-networking']
	});
	page = await browser.newPage();
	await page.addScriptTag({ content: await script() });
}, 120_000);

afterAll(async () => {
	await browser.close();
});

function inChromium(bytes: Uint8Array, context: ReadContext): Promise<string> {
	return page.evaluate(
		([base64, given]) => (globalThis as unknown as { offered: Offered }).offered.readAndAssess(base64, given),
		[Buffer.from(bytes).toString('base64'), context] as const
	);
}

describe('Chromium and Node', () => {
	it.each(names)('say the same of %s, to the bit', async (name) => {
		const bytes = readFileSync(join(folder, name));
		const asked = readExport(bytes, contextOf());
		const answers = asked.kind === 'question' ? asked.question.choices.map(({ answer }) => answer) : [];
		for (const answer of [{}, ...answers]) {
			const here = readAndAssess(bytes, contextOf(answer));
			expect(await inChromium(bytes, contextOf(answer))).toBe(here);
		}
	});

	it('say the same of damaged files', async () => {
		const samples = sampleFiles();
		for (let n = 1; n <= 150; n++) {
			const bytes = mutated(samples, n);
			expect(await inChromium(bytes, contextOf())).toBe(readAndAssess(bytes, contextOf()));
		}
	});

	it('are asked something that has digits to differ in', () => {
		const said = readAndAssess(readFileSync(join(folder, 'asparagus-gap.csv')), contextOf());
		expect(said.match(/\d\.\d{10,}/g)?.length).toBeGreaterThan(100);
	});
});
