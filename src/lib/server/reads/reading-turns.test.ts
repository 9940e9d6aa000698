import { describe, expect, it } from 'vitest';
import { turnsOf } from './reading-turns';

/** Works that end when they are told to, and what was running when. */
function scene() {
	const inTurn = turnsOf({ mostAtOnce: 2, mostHeavy: 1 });
	const running: string[] = [];
	const ends = new Map<string, () => void>();
	const add = (name: string, isHeavy: boolean, isFailing = false) => {
		const done = inTurn(isHeavy, async () => {
			running.push(name);
			await new Promise<void>((resolve) => ends.set(name, resolve));
			running.splice(running.indexOf(name), 1);
			if (isFailing) throw new Error(name);
			return name;
		});
		done.catch(() => {});
		return done;
	};
	const end = async (name: string) => {
		ends.get(name)?.();
		// Each step of a turn is one of these.
		for (let step = 0; step < 10; step++) await Promise.resolve();
	};
	return { add, end, running };
}

describe('the turns of readings', () => {
	it('let two run at once, in the order they came', async () => {
		const { add, end, running } = scene();
		for (const name of ['a', 'b', 'c', 'd']) void add(name, false);
		expect(running).toEqual(['a', 'b']);
		await end('b');
		expect(running).toEqual(['a', 'c']);
		await end('a');
		expect(running).toEqual(['c', 'd']);
	});

	it('never hold two heavy files, and let a light one pass', async () => {
		const { add, end, running } = scene();
		void add('heavy 1', true);
		void add('heavy 2', true);
		void add('light', false);
		expect(running).toEqual(['heavy 1', 'light']);
		await end('light');
		expect(running).toEqual(['heavy 1']);
		await end('heavy 1');
		expect(running).toEqual(['heavy 2']);
	});

	it('pass on after a failure, which reaches who asked', async () => {
		const { add, end, running } = scene();
		const failing = add('bad', true, true);
		const next = add('good', true);
		await end('bad');
		await expect(failing).rejects.toThrow('bad');
		expect(running).toEqual(['good']);
		await end('good');
		await expect(next).resolves.toBe('good');
	});
});
