import { v7 as uuid } from 'uuid';
import type { UploadAnswer } from '$lib/schemas/read';

/** A file on its way: how far it is, and what came back. */
export interface Sending {
	answer: Promise<UploadAnswer>;
	stop: () => void;
}

/** What the server refused, or the network. */
export class NotSent extends Error {
	override readonly name = 'NotSent';
}

/**
 * Sends one export with the progress that `fetch` does not report. Its id is made here, so that sending it again after
 * the network failed in the answer is harmless.
 */
export function sendFile(
	url: string,
	file: File,
	onprogress: (fraction: number) => void,
	id: string = uuid()
): Sending {
	const request = new XMLHttpRequest();
	const form = new FormData();
	form.append('id', id);
	form.append('files', file);
	const answer = new Promise<UploadAnswer>((resolve, reject) => {
		request.upload.onprogress = ({ loaded, total }) => onprogress(total > 0 ? loaded / total : 0);
		request.onload = () => {
			if (request.status === 200) resolve(JSON.parse(request.responseText) as UploadAnswer);
			else reject(new NotSent(sentenceOf(request.responseText)));
		};
		request.onerror = () =>
			reject(new NotSent('The network broke off. Nothing is lost; send the file again.'));
		request.onabort = () => reject(new NotSent('Stopped. Nothing was kept.'));
		request.open('POST', url);
		request.send(form);
	});
	return { answer, stop: () => request.abort() };
}

function sentenceOf(text: string): string {
	try {
		const body: unknown = JSON.parse(text);
		if (body && typeof body === 'object' && 'message' in body && typeof body.message === 'string')
			return body.message;
	} catch {
		// Not our own answer: a proxy's page, say.
	}
	return 'The server could not take the file. Send it again in a minute.';
}
