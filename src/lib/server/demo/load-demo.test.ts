import { describe, expect, it } from 'vitest';
import { useTestDatabase } from '../../../../tests/helpers/test-database';
import { loadDemo } from './load-demo';
useTestDatabase();
describe('demo', () => {
	it('loads', async () => {
		const t = performance.now();
		const n = await loadDemo(new Date('2026-04-03T07:35:00Z'), (l) => console.log(l, Math.round(performance.now() - t)));
		expect(n).toBeGreaterThan(50);
	}, 200000);
});
