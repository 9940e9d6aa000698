import { gzipSync } from 'node:zlib';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeApiToken, newApiSecret } from '../../src/lib/server/accounts/api-tokens';
import { systemContext } from '../../src/lib/server/context';
import { buildSite, buildUser } from '../helpers/factories';
import { startProduct, type Product } from '../helpers/product';
import { useTestDatabase } from '../helpers/test-database';

const minutes = (count: number): Uint8Array => {
	const lines = ['time,temperature °C'];
	for (let i = 0; i < count; i++)
		lines.push(
			`${new Date(Date.UTC(2024, 0, 1) + i * 60_000).toISOString()},${(4 + (i % 7) / 10).toFixed(1)}`
		);
	return new TextEncoder().encode(`${lines.join('\n')}\n`);
};

// Made before there is a connection: one that idles while this is written would have been closed by its other end.
const heavy = minutes(720_000);

useTestDatabase();

let product: Product;
let authorization: string;
let idleMs: number;

beforeAll(async () => {
	const dock = await buildUser(['dock'], { sites: [await buildSite({ zone: 'Europe/Amsterdam' })] });
	const secret = newApiSecret();
	await makeApiToken(systemContext(new Date()), dock.email, secret);
	authorization = `Bearer ${secret}`;
	product = await startProduct();
	const idle: number[] = [];
	while (idle.length < 40) idle.push(await healthMs());
	idleMs = Math.max(...idle.slice(10));
}, 90_000);
afterAll(() => product.stop());

async function healthMs(): Promise<number> {
	const from = performance.now();
	const answer = await fetch(new URL('/api/v1/health', product.address));
	expect(answer.status).toBe(200);
	await answer.arrayBuffer();
	return performance.now() - from;
}

interface Met {
	answer: unknown;
	/** How long each call for health took while the file was with the product. */
	health: number[];
}

/** Inspects a file and asks for health, one call after the other, until the answer is there. */
async function whileInspecting(bytes: Uint8Array): Promise<Met> {
	const body = new FormData();
	body.append('file', new File([Uint8Array.from(bytes)], 'export.csv'));
	let isAnswered = false;
	const inspected = fetch(new URL('/api/v1/reads/inspect', product.address), {
		method: 'POST',
		body,
		headers: { authorization }
	})
		.then((response) => response.json() as Promise<unknown>)
		.finally(() => (isAnswered = true));
	const health: number[] = [];
	while (!isAnswered) health.push(await healthMs());
	return { answer: await inspected, health };
}

/** 200 ms, and on a machine that has others to serve, five times its slowest answer when the product is idle. */
const longestMs = () => Math.max(200, 5 * idleMs);

/** A single answer may meet the file's own bytes coming in, or another program's turn on the processor. */
const stalledMs = 2000;

const medianOf = (values: readonly number[]): number =>
	[...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? Infinity;

describe('while a heavy file is read, others are answered', () => {
	it('of 20 MB, which is read whole', async () => {
		const { answer, health } = await whileInspecting(heavy);
		expect(answer).toMatchObject({ outcome: 'ok', channels: [{ readings: 720_000 }] });
		expect(health.length).toBeGreaterThan(5);
		expect(medianOf(health)).toBeLessThan(longestMs());
		expect(Math.max(...health)).toBeLessThan(stalledMs);
	}, 120_000);

	it.each([
		['a line of 10 MB', () => new TextEncoder().encode('4.5,'.repeat(2_500_000)), 'line-too-long'],
		['a gzip of more than 50 MB', () => gzipSync(new Uint8Array(60 * 1024 * 1024).fill(52)), 'too-large'],
		['a million brackets', () => new TextEncoder().encode('['.repeat(1_000_000)), 'too-deep'],
		[
			'rows of 16,000 cells',
			() => new TextEncoder().encode(`${'5,'.repeat(16_000)}\n`.repeat(300)),
			'line-too-long'
		]
	])(
		'of %s, which is refused',
		async (_, bytes, code) => {
			const { answer, health } = await whileInspecting(bytes());
			expect(answer).toMatchObject({ outcome: 'refused', refusal: { code } });
			expect(medianOf(health)).toBeLessThan(longestMs());
			expect(Math.max(...health)).toBeLessThan(stalledMs);
		},
		60_000
	);
});
