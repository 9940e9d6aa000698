import type { Context } from '../context';
import { InvalidFields } from '../shipments/invalid-fields';
import { keepBytes } from '../storage/store';

const prefix = 'data:image/png;base64,';
/** First bytes of a PNG. Source: PNG specification, third edition, 5.2. */
const pngSignature = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);

/** Keeps a drawn signature. @returns the file's id, null when nothing was drawn */
export async function keepDriverSignature(ctx: Context, drawn: string | null): Promise<string | null> {
	if (drawn === null) return null;
	const bytes = drawn.startsWith(prefix)
		? Buffer.from(drawn.slice(prefix.length), 'base64')
		: Buffer.alloc(0);
	const isPng = bytes.subarray(0, pngSignature.length).equals(pngSignature);
	if (!isPng || !bytes.subarray(-8, -4).equals(Buffer.from('IEND')))
		throw new InvalidFields({ driverSignature: 'The drawn signature did not come through. Draw it again.' });
	return (await keepBytes(bytes, 'image/png', ctx.now)).id;
}
