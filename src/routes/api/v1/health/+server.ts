import { checkHealth } from '$lib/server/health/check-health';
import type { RequestHandler } from './$types';

export const GET: RequestHandler = async () => {
	const health = await checkHealth();
	return Response.json(health, { status: health.database === 'up' ? 200 : 503 });
};
