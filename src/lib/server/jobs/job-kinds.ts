import type { Context } from '../context';

/** Does one job's work. Run again after a crash, so it must notice what it has done already. */
export type JobHandler = (ctx: Context, payload: Record<string, string>) => Promise<void>;

const handlers = new Map<string, JobHandler>();

/** Says who does jobs of a kind. */
export function registerJobKind(kind: string, handler: JobHandler): void {
	handlers.set(kind, handler);
}

export function findJobHandler(kind: string): JobHandler | null {
	return handlers.get(kind) ?? null;
}
