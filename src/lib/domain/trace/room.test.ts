import { describe, expect, it } from 'vitest';
import { ownRoom, SharedRoom } from './room';

describe('room for long arrays', () => {
	it('of one’s own is new for every array', () => {
		const first = ownRoom.floats('used', 3).fill(7);
		expect([...ownRoom.floats('used', 3)]).toEqual([0, 0, 0]);
		expect([...first]).toEqual([7, 7, 7]);
		expect([ownRoom.wholes('a', 2).length, ownRoom.bytes('a', 2).length]).toEqual([2, 2]);
	});

	it('that is shared gives the same memory by the same name, grown where it must', () => {
		const room = new SharedRoom();
		const first = room.floats('used', 3).fill(7);
		expect([...room.floats('used', 2)]).toEqual([7, 7]);
		expect(room.floats('used', 2).buffer).toBe(first.buffer);
		expect([...room.floats('used', 4)]).toEqual([0, 0, 0, 0]);
		expect(room.floats('other', 3).buffer).not.toBe(first.buffer);
		expect([room.wholes('w', 5).length, room.bytes('b', 6).length]).toEqual([5, 6]);
	});
});
