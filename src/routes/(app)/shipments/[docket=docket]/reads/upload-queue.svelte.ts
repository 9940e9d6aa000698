import { SvelteMap } from 'svelte/reactivity';
import type { UploadAnswer } from '$lib/schemas/read';
import type { Glance } from './file-glance';
import type { DeviceReader } from './read-on-device';
import { NotSent, type Send } from './send-file';

/** Where one file stands. */
export type UploadStep = 'reading' | 'queued' | 'sending' | 'sent' | 'no-network' | 'failed' | 'stopped';

type Read = UploadAnswer['reads'][number];

/** One file of an upload, with all that is known of it. */
export interface UploadItem {
	/** Made here, once: sent again it is the same read. */
	readonly id: string;
	readonly file: File;
	step: UploadStep;
	fraction: number;
	/** What this device read; undefined until it has, null where it cannot. */
	glance: Glance | null | undefined;
	/** What the server made of it. */
	read: Read | null;
	/** Why it was not taken. */
	trouble: string;
}

interface Tools {
	send: Send;
	reader: Pick<DeviceReader, 'read'>;
	newId: () => string;
}

/**
 * Files on their way, each with a state of its own: read on this device, then sent one at a time. One that fails stops
 * no other; after a broken network all that is missing goes again by itself.
 */
export class UploadQueue {
	items = $state<UploadItem[]>([]);
	#running: Promise<void> | null = null;
	#stops = new SvelteMap<string, () => void>();
	readonly #tools: Tools;

	constructor(tools: Tools) {
		this.#tools = tools;
	}

	/** Whether leaving the page now would lose something. */
	get isBusy(): boolean {
		return this.items.some(({ step }) => ['reading', 'queued', 'sending', 'no-network'].includes(step));
	}

	/** Takes files in; done when each has arrived or failed. */
	async add(files: readonly File[]): Promise<void> {
		const added = files.map((file): UploadItem => {
			return {
				id: this.#tools.newId(),
				file,
				step: 'reading',
				fraction: 0,
				glance: undefined,
				read: null,
				trouble: ''
			};
		});
		this.items.push(...added);
		await Promise.all(added.map(({ id, file }) => this.#look(id, file)));
		await this.#run();
	}

	/** Sends again what did not arrive: one file, or all that the network kept back. */
	async retry(id?: string): Promise<void> {
		for (const item of this.items) {
			const isMeant = id === undefined ? item.step === 'no-network' : item.id === id;
			if (isMeant && ['no-network', 'failed', 'stopped'].includes(item.step)) {
				item.step = 'queued';
				item.trouble = '';
			}
		}
		await this.#run();
	}

	/** Stops one file: on its way, or before. */
	stop(id: string): void {
		this.#stops.get(id)?.();
		const item = this.#item(id);
		if (item && (item.step === 'queued' || item.step === 'reading')) this.#fail(item, stopped);
	}

	#item(id: string): UploadItem | undefined {
		return this.items.find((item) => item.id === id);
	}

	async #look(id: string, file: File): Promise<void> {
		const glance = await this.#tools.reader.read(id, file);
		const item = this.#item(id);
		if (!item) return;
		item.glance = glance;
		if (item.step === 'reading') item.step = 'queued';
		void this.#run();
	}

	/** One at a time: a dock's network is slow, and ten at once would all be late. */
	#run(): Promise<void> {
		this.#running ??= this.#sendAll().finally(() => (this.#running = null));
		return this.#running;
	}

	async #sendAll(): Promise<void> {
		for (;;) {
			const next = this.items.find(({ step }) => step === 'queued');
			if (!next) return;
			await this.#sendOne(next);
		}
	}

	async #sendOne(item: UploadItem): Promise<void> {
		item.step = 'sending';
		item.fraction = 0;
		try {
			const sending = this.#tools.send(item.file, item.id, (fraction) => (item.fraction = fraction));
			this.#stops.set(item.id, sending.stop);
			const { reads, refused } = await sending.answer;
			item.read = reads[0] ?? null;
			item.step = item.read ? 'sent' : 'failed';
			item.trouble = item.read ? '' : (refused[0]?.message ?? '');
		} catch (error) {
			this.#fail(item, error instanceof NotSent ? error : new NotSent(String(error), 'refused'));
		} finally {
			this.#stops.delete(item.id);
		}
	}

	#fail(item: UploadItem, { message, reason }: NotSent): void {
		item.step = reason === 'network' ? 'no-network' : reason === 'stopped' ? 'stopped' : 'failed';
		item.trouble = message;
	}
}

const stopped = new NotSent('Stopped. Nothing was kept.', 'stopped');
