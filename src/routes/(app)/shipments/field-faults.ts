import { fail } from '@sveltejs/kit';
import { orFail } from '$lib/server/request';
import { InvalidFields } from '$lib/server/shipments/invalid-fields';

/** As `orFail`, with each fault beside its field where the use case named it. */
export function orFieldFaults(e: unknown, values: Record<string, unknown>) {
	if (e instanceof InvalidFields) return fail(422, { values, issues: { ...e.issues }, code: 'invalid' });
	return orFail(e, values);
}
