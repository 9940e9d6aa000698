import type { UploadAnswer } from '$lib/schemas/read';

/** A file on its way: how far it is, and what came back. */
export interface Sending {
	answer: Promise<UploadAnswer>;
	stop: () => void;
}

/** Why a file did not arrive: the network may come back, a refusal stays, a person stopped it. */
export type NotSentReason = 'network' | 'refused' | 'stopped';

/** What the server refused, or the network. */
export class NotSent extends Error {
	override readonly name = 'NotSent';
	constructor(
		message: string,
		readonly reason: NotSentReason
	) {
		super(message);
	}
}

/** Sends one export. */
export type Send = (file: File, id: string, onprogress: (fraction: number) => void) => Sending;

/** A server that restarts, or a proxy before it, answers so; the file can go again. */
const passing = new Set([0, 408, 502, 503, 504]);

/**
 * Sends exports to one address, with the progress that `fetch` does not report. The id is the sender's, so that
 * sending a file again after the network failed in the answer is harmless.
 */
export function sender(url: string): Send {
	return (file, id, onprogress) => {
		const request = new XMLHttpRequest();
		const form = new FormData();
		form.append('id', id);
		form.append('files', file);
		const answer = new Promise<UploadAnswer>((resolve, reject) => {
			const fail = (text: string, reason: NotSentReason) => reject(new NotSent(text, reason));
			request.upload.onprogress = ({ loaded, total }) => onprogress(total > 0 ? loaded / total : 0);
			request.onload = () => {
				if (request.status === 200) resolve(JSON.parse(request.responseText) as UploadAnswer);
				else fail(sentenceOf(request.responseText), passing.has(request.status) ? 'network' : 'refused');
			};
			request.onerror = () => fail('The network broke off. Nothing is lost.', 'network');
			request.onabort = () => fail('Stopped. Nothing was kept.', 'stopped');
			request.open('POST', url);
			request.send(form);
		});
		return { answer, stop: () => request.abort() };
	};
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
