import { AsyncLocalStorage, AsyncResource } from 'node:async_hooks';
import { Sequelize } from 'sequelize';

/**
 * Lets every query made inside a transaction's closure join that transaction. Without, a query that forgets to say so
 * takes a second connection: ten writers at once would hold all ten and wait for an eleventh for ever, and what they
 * read would not be what they locked.
 */
export function joinTransactions(): void {
	const store = new AsyncLocalStorage<Map<string, unknown>>();
	const namespace = {
		get: (key: string) => store.getStore()?.get(key),
		set: (key: string, value: unknown) => void store.getStore()?.set(key, value),
		run: (work: (context: unknown) => void) => store.run(new Map(store.getStore()), () => work(undefined)),
		bind: (work: () => unknown) => AsyncResource.bind(work)
	};
	Sequelize.useCLS(namespace);
}
