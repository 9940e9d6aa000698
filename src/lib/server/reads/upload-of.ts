import { Readable } from 'node:stream';
import type { ReadableStream } from 'node:stream/web';
import type { Upload } from './receive-upload';

/** A request's body as it comes in, not yet read. */
export function uploadOf(request: Request): Upload {
	// The platform's and Node's types of one and the same stream differ.
	const body = request.body ? Readable.fromWeb(request.body as ReadableStream) : Readable.from([]);
	return { body, contentType: request.headers.get('content-type') };
}
