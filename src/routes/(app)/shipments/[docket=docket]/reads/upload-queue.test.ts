import { describe, expect, it } from 'vitest';
import type { UploadAnswer } from '$lib/schemas/read';
import type { Glance } from './file-glance';
import { NotSent, type NotSentReason } from './send-file';
import { UploadQueue } from './upload-queue.svelte';

const glance: Glance = { kind: 'refused', code: 'empty', line: null, found: null };
const file = (name: string) => new File(['x'], name);
const names = (many: number) => Array.from({ length: many }, (_, i) => `f${i}.csv`);

type Fate = NotSentReason | 'sent' | 'refused-one';

/** A network of which each file's fates are known beforehand, the last one lasting. */
function scene(fates: Record<string, Fate[]> = {}) {
	const sent: { name: string; id: string }[] = [];
	let ids = 0;
	let atOnce = 0;
	let mostAtOnce = 0;
	const queue = new UploadQueue({
		newId: () => `id-${++ids}`,
		reader: { read: () => Promise.resolve(glance) },
		send: ({ name }, id, onprogress) => {
			sent.push({ name, id });
			mostAtOnce = Math.max(mostAtOnce, ++atOnce);
			const all = fates[name] ?? ['sent'];
			const fate = all.length > 1 ? all.shift() : all[0];
			onprogress(0.5);
			const answer = Promise.resolve().then((): UploadAnswer => {
				atOnce--;
				if (fate === 'refused-one')
					return { reads: [], refused: [{ fileName: name, code: 'too-large', message: 'Too large.' }] };
				if (fate !== 'sent') throw new NotSent(`no: ${fate}`, fate as NotSentReason);
				const read = { id, fileName: name, state: 'understood', isDuplicate: false };
				return { reads: [read as UploadAnswer['reads'][number]], refused: [] };
			});
			return { answer, stop: () => {} };
		}
	});
	return { queue, sent, most: () => mostAtOnce };
}

describe('ten files at once', () => {
	it('are sent one at a time, each with a state of its own', async () => {
		const { queue, sent, most } = scene();
		await queue.add(names(10).map(file));
		expect(queue.items.map(({ step }) => step)).toEqual(Array(10).fill('sent'));
		expect(queue.items.every((item) => item.glance?.kind === 'refused')).toBe(true);
		expect(new Set(sent.map(({ id }) => id)).size).toBe(10);
		expect(most()).toBe(1);
		expect(queue.isBusy).toBe(false);
	});

	it('go on where one fails, and say which', async () => {
		const { queue } = scene({ 'f3.csv': ['refused'], 'f5.csv': ['refused-one'], 'f7.csv': ['stopped'] });
		await queue.add(names(10).map(file));
		const odd = queue.items.filter(({ step }) => step !== 'sent');
		expect(odd.map(({ file: { name }, step, trouble }) => [name, step, trouble])).toEqual([
			['f3.csv', 'failed', 'no: refused'],
			['f5.csv', 'failed', 'Too large.'],
			['f7.csv', 'stopped', 'no: stopped']
		]);
	});

	it('lose nothing when the network drops: what is missing goes again with the same id', async () => {
		const { queue, sent } = scene({
			'f1.csv': ['network', 'sent'],
			'f2.csv': ['network', 'network', 'sent']
		});
		await queue.add(names(4).map(file));
		expect(queue.items.map(({ step }) => step)).toEqual(['sent', 'no-network', 'no-network', 'sent']);
		expect(queue.isBusy).toBe(true);
		await queue.retry();
		await queue.retry();
		expect(queue.items.map(({ step }) => step)).toEqual(Array(4).fill('sent'));
		const ids = (name: string) => sent.filter((one) => one.name === name).map(({ id }) => id);
		expect(ids('f1.csv')).toEqual(['id-2', 'id-2']);
		expect(ids('f2.csv')).toEqual(['id-3', 'id-3', 'id-3']);
		expect(ids('f0.csv')).toEqual(['id-1']);
	});

	it('are sent again one by one where a person says so, and never when they have arrived', async () => {
		const { queue, sent } = scene({ 'f0.csv': ['refused', 'sent'], 'f1.csv': ['refused'] });
		await queue.add(names(3).map(file));
		await queue.retry('id-1');
		await queue.retry('id-3');
		expect(queue.items.map(({ step }) => step)).toEqual(['sent', 'failed', 'sent']);
		expect(sent).toHaveLength(4);
	});

	it('can be stopped before they are sent', async () => {
		const { queue, sent } = scene();
		const all = queue.add(names(3).map(file));
		queue.stop('id-2');
		await all;
		expect(queue.items.map(({ step }) => step)).toEqual(['sent', 'stopped', 'sent']);
		expect(sent.map(({ name }) => name)).toEqual(['f0.csv', 'f2.csv']);
	});

	it('are followed by those chosen later', async () => {
		const { queue } = scene();
		await Promise.all([queue.add(names(2).map(file)), queue.add([file('later.csv')])]);
		expect(queue.items.map(({ file: { name }, step }) => `${name} ${step}`)).toEqual([
			'f0.csv sent',
			'f1.csv sent',
			'later.csv sent'
		]);
	});
});
