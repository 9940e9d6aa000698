import { Refusal } from '../refusals';

/** The JSON of a request. @throws Refusal `invalid` where it is none */
export async function readJson(request: Request): Promise<unknown> {
	try {
		return await request.json();
	} catch (error) {
		if (error instanceof SyntaxError) throw new Refusal('invalid', 'The body is not JSON.');
		throw error;
	}
}
