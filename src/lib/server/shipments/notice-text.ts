import { maxImportBytes } from '../../schemas/import';
import { Refusal } from '../refusals';

const tooLarge = 'The file is larger than 2 MB. Send it in parts.';
/** Room for what a form puts around its file. */
const formBytes = 10_000;

/** The text of an uploaded sheet: UTF-8, else as Western Windows sheets are saved. */
export async function noticeText(request: Request): Promise<{ name: string; text: string }> {
	if (Number(request.headers.get('content-length') ?? 0) > maxImportBytes + formBytes)
		throw new Refusal('too-large', tooLarge);
	const file = (await request.formData()).get('file');
	if (!(file instanceof File) || file.name === '') throw new Refusal('not-multipart', 'Choose a file first.');
	if (file.size > maxImportBytes) throw new Refusal('too-large', tooLarge);
	const bytes = await file.arrayBuffer();
	return { name: file.name, text: decoded(bytes) };
}

function decoded(bytes: ArrayBuffer): string {
	try {
		return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
	} catch (error) {
		if (error instanceof TypeError) return new TextDecoder('windows-1252').decode(bytes);
		throw error;
	}
}
