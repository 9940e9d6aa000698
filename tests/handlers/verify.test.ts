import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startProduct, Visitor, type Product } from '../helpers/product';
import { arrivedDocket, sealedFor, signed, type ArrivedDocket } from '../helpers/sealed-docket';
import { useTestDatabase } from '../helpers/test-database';

useTestDatabase();

let product: Product;
let docket: ArrivedDocket;
/** What the first and the second version can be asked by. */
const first = { code: '', sha256: '' };
const second = { code: '', sha256: '' };

beforeAll(async () => {
	docket = await arrivedDocket();
	for (const version of [first, second]) {
		const disposition = await signed(docket);
		const { sha256 } = await sealedFor(docket.ctx, docket.shipment.number, disposition);
		Object.assign(version, { code: disposition.frozenSha256.slice(0, 16), sha256 });
	}
	product = await startProduct();
}, 90_000);

afterAll(() => product.stop());

/** A stranger without a session. */
const ask = (path: string, init: RequestInit = {}) => new Visitor(product.address).request(path, init);

/** Everything of the load that a stranger must not learn. */
function secrets(): string[] {
	const { shipment, supplier, carrier, site, lines, ctx } = docket;
	const ofLines = lines.flatMap(({ lot, description }) => [lot, description]);
	return [
		...[shipment.number, shipment.title, shipment.id, supplier.name, carrier.name, site.name],
		...[...ofLines, ctx.actor.name, 'Cold throughout.', 'Counted again', 'accept']
	];
}

describe('asking about a report without a session', () => {
	it.each([
		['the code of the current version', () => second.code, 'Genuine and current', '2'],
		[
			'the code as it is printed, in fours',
			() => second.code.replace(/.{4}/gu, '$& '),
			'Genuine and current',
			'2'
		],
		['the current PDF', () => `${second.sha256}?of=file`, 'Genuine and current', '2'],
		['the code of the version before', () => first.code, 'Genuine, but superseded', '1'],
		['the PDF of the version before', () => `${first.sha256}?of=file`, 'Genuine, but superseded', '1'],
		['a code nobody made', () => '0'.repeat(16), 'Not known here', null],
		['a PDF with one other byte', () => `${'a'.repeat(64)}?of=file`, 'Not known here', null],
		['a docket’s number', () => docket.shipment.number, 'Not known here', null],
		['nonsense', () => '%25%27%22<script>', 'Not known here', null]
	])('by %s says so, and nothing else about the load', async (_what, asked, title, version) => {
		const answer = await ask(`/verify/${asked().replace(/ /g, '%20')}`);
		expect(answer.status).toBe(200);
		expect(answer.headers.get('cache-control')).toBe('no-store');
		const page = (await answer.text()).replace(/<script[\s\S]*?import\([\s\S]*?<\/script>/, '');
		expect(page).toContain(title);
		if (version !== null) expect(page).toMatch(new RegExp(`Version[\\s\\S]{0,200}>${version}<`));
		else expect(page).not.toMatch(/>Signed</);
		for (const secret of secrets().filter((one) => one !== asked())) expect(page).not.toContain(secret);
	});

	it('tells a program reading the page’s data no more', async () => {
		for (const { code } of [first, second]) {
			const data = await (await ask(`/verify/${code}/__data.json`)).text();
			for (const secret of secrets()) expect(data).not.toContain(secret);
		}
	});

	it('is led to the answer by a typed code, and told what is wrong with one that is none', async () => {
		const led = await ask(`/verify?code=${second.code.toUpperCase()}`);
		expect([led.status, led.headers.get('location')]).toEqual([303, `/verify/${second.code}`]);
		const told = await (await ask('/verify?code=9d40')).text();
		expect(told).toContain('A code has sixteen digits and letters from a to f.');
	});

	it('finds the address that older reports carry', async () => {
		const moved = await ask(`/check/${second.code}`);
		expect([moved.status, moved.headers.get('location')]).toEqual([308, `/verify/${second.code}`]);
	});

	it('cannot upload a PDF: nothing here takes one', async () => {
		const origin = product.address;
		for (const path of ['/verify', `/verify/${second.code}`, '/verify?/check']) {
			const body = new FormData();
			body.append('report', new File(['%PDF-1.7'], 'report.pdf'));
			const answer = await ask(path, { method: 'POST', body, headers: { origin } });
			expect(answer.status, path).toBeGreaterThanOrEqual(404);
			expect(answer.status, path).toBeLessThan(500);
		}
	});

	it('is refused after sixty look-ups in a quarter of an hour', async () => {
		const visitor = new Visitor(product.address);
		const statuses: number[] = [];
		for (let i = 0; i < 62; i++) statuses.push((await visitor.request(`/verify/${'1'.repeat(16)}`)).status);
		expect(statuses.at(-1)).toBe(429);
	});
});
