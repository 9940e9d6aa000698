import { maxPhotoBytes } from '../../schemas/photo';
import { Refusal } from '../refusals';

/** Room for the form's other fields beside the picture. */
const formBytes = 20_000;

/** The photograph and the fields of an upload. A body that says it is too large is not even read. */
export async function photoOf(
	request: Request
): Promise<{ fields: Record<string, unknown>; bytes: Uint8Array }> {
	if (!request.headers.get('content-type')?.startsWith('multipart/form-data'))
		throw new Refusal('not-multipart');
	if (Number(request.headers.get('content-length') ?? 0) > maxPhotoBytes + formBytes)
		throw new Refusal('too-large', 'The photograph is larger than 10 MB. Take it again at a smaller size.');
	const form = await formOf(request);
	const photo = form.get('photo');
	if (!(photo instanceof File) || photo.size === 0) throw new Refusal('not-multipart');
	const fields = Object.fromEntries([...form].filter(([, value]) => typeof value === 'string'));
	return { fields, bytes: new Uint8Array(await photo.arrayBuffer()) };
}

async function formOf(request: Request): Promise<FormData> {
	try {
		return await request.formData();
	} catch (error) {
		if (error instanceof TypeError) throw new Refusal('upload-broken');
		throw error;
	}
}
