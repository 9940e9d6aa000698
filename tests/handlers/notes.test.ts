import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Note } from '../../src/lib/server/db/models/note';
import { startProduct, type Product, type Visitor } from '../helpers/product';
import { useTestDatabase } from '../helpers/test-database';
import { signInAs } from './sign-in-as';
import { buildSeenLoad } from './signed-load';

useTestDatabase();

let product: Product;
let load: Awaited<ReturnType<typeof buildSeenLoad>>;
let qa: Visitor;
let supplier: Visitor;

beforeAll(async () => {
	load = await buildSeenLoad();
	product = await startProduct();
	qa = await signInAs(product, load.people.qa);
	supplier = await signInAs(product, load.people.supplier);
}, 90_000);

afterAll(() => product.stop());

/** A form as a browser without scripts sends it. */
function form(text: string, file?: File): FormData {
	const fields = new FormData();
	fields.append('text', text);
	fields.append('files', file ?? new File([], ''));
	return fields;
}

const post = (path: string, body: FormData, accept = 'text/html') =>
	qa.request(path, { method: 'POST', body, headers: { accept } });

const page = async () => (await qa.request(`/shipments/${load.shipment.number}`)).text();

describe('notes on the docket page', () => {
	it('are written by the form, and stand there with their files and the hash of each', async () => {
		const file = new File(['a;b\n'], 'counts.csv', { type: 'text/html' });
		const sent = await post(`/shipments/${load.shipment.number}?/note`, form('Counted again.', file));
		expect(sent.status).toBe(200);
		const shown = await page();
		for (const part of ['Carrier was told at 06:40.', 'letter.pdf', 'Counted again.', 'counts.csv'])
			expect(shown).toContain(part);
		// printf 'a;b\n' | sha256sum, coreutils
		expect(shown).toContain('9a8be2eb1604c06722f17a9bbdb1160123efa0dcf87979013ead941593977af2');
	});

	it('are not taken with a page attached; the words come back with the sentence', async () => {
		const file = new File(['<script>'], 'x.html', { type: 'text/html' });
		const answer = await post(`/shipments/${load.shipment.number}?/note`, form('Not lost.', file));
		expect(answer.status).toBe(422);
		const shown = await answer.text();
		expect(shown).toContain('Not lost.');
		expect(shown).toContain('x.html is of a kind that is not taken here.');
		expect(await Note.count({ where: { text: 'Not lost.' } })).toBe(0);
	});

	it('are taken by the API with 201, and refused with code and sentence', async () => {
		const path = `/api/v1/shipments/${load.shipment.number}/notes`;
		const taken = await post(path, form('By a device.'));
		expect(taken.status).toBe(201);
		expect(await taken.json()).toEqual({ id: expect.stringMatching(/^[0-9a-f-]{36}$/) });
		const refused = await post(path, form(' '));
		expect(refused.status).toBe(422);
		expect(await refused.json()).toEqual({ code: 'invalid', message: 'Write the note.' });
	});
});

describe('a file of a note', () => {
	it('goes out as an attachment that no browser runs, whatever it calls itself', async () => {
		const answer = await qa.request(`/api/v1/notes/files/${load.noteFileId}`);
		expect(await answer.text()).toBe('%PDF-1.7');
		expect(Object.fromEntries(answer.headers)).toMatchObject({
			'content-type': 'application/octet-stream',
			'content-disposition': expect.stringMatching(/^attachment; filename="letter\.pdf"/),
			'content-security-policy': "sandbox; default-src 'none'",
			'x-content-type-options': 'nosniff'
		});
	});
});

describe('a supplier', () => {
	it('gets no file of a note, and does not learn its name', async () => {
		const answer = await supplier.request(`/api/v1/notes/files/${load.noteFileId}`);
		expect(answer.status).toBe(403);
		expect(await answer.text()).not.toContain('letter');
	});
});
