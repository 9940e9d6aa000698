import { mkdir, readdir, readFile, rename, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { v7 as uuid } from 'uuid';
import { sha256Hex } from '../storage/sha256';

/** A mail as the mailbox page shows it. */
export interface MailboxEntry {
	id: string;
	receivedAt: string;
	from: string;
	to: string;
	subject: string;
}

export interface MailboxMail extends MailboxEntry {
	html: string;
	text: string;
	attachments: { fileName: string; bytes: number }[];
}

/** A mail that is sent again after its answer was lost has the same Message-ID; one of them is kept. */
async function isFirst(folder: string, mail: Buffer): Promise<boolean> {
	const head = mail.subarray(0, 16_384).toString('latin1');
	const messageId = /^Message-ID:\s*(\S+)/im.exec(head)?.[1];
	if (!messageId) return true;
	try {
		await writeFile(join(folder, `${sha256Hex(messageId)}.id`), '', { flag: 'wx' });
		return true;
	} catch (error) {
		if (error instanceof Error && 'code' in error && error.code === 'EEXIST') return false;
		throw error;
	}
}

async function deliver(folder: string, stream: AsyncIterable<Buffer>): Promise<void> {
	const chunks: Buffer[] = [];
	for await (const chunk of stream) chunks.push(chunk);
	await mkdir(folder, { recursive: true });
	const bytes = Buffer.concat(chunks);
	if (!(await isFirst(folder, bytes))) return;
	const path = join(folder, `${uuid()}.eml`);
	await writeFile(`${path}.part`, bytes);
	await rename(`${path}.part`, path);
}

/** A real SMTP server on loopback that keeps what it is given as files: the stand-in while no mail server is set. */
export function startMailbox(folder: string, port: number): Promise<{ stop: () => Promise<void> }> {
	const server = new SMTPServer({
		authOptional: true,
		// The package's own certificate has run out; loopback needs none.
		disabledCommands: ['STARTTLS', 'AUTH'],
		onData(stream, _session, callback) {
			deliver(folder, stream).then(() => callback(), callback);
		}
	});
	return new Promise((resolve, reject) => {
		server.once('error', reject);
		server.listen(port, '127.0.0.1', () => {
			server.removeListener('error', reject);
			server.on('error', () => {});
			resolve({ stop: () => new Promise((closed) => server.close(() => closed())) });
		});
	});
}

const idPattern = /^[0-9a-f-]{36}$/;

async function parse(folder: string, id: string): Promise<MailboxMail> {
	const mail = await simpleParser(await readFile(join(folder, `${id}.eml`)));
	const to = Array.isArray(mail.to) ? mail.to[0] : mail.to;
	return {
		id,
		receivedAt: (mail.date ?? new Date(0)).toISOString(),
		from: mail.from?.text ?? '',
		to: to?.text ?? '',
		subject: mail.subject ?? '',
		html: mail.html || '',
		text: mail.text ?? '',
		attachments: mail.attachments.map((a) => ({ fileName: a.filename ?? 'file', bytes: a.size }))
	};
}

/** Newest first. */
export async function listMailbox(folder: string, limit = 100): Promise<MailboxEntry[]> {
	await mkdir(folder, { recursive: true });
	const ids = (await readdir(folder))
		.filter((name) => name.endsWith('.eml'))
		.map((name) => name.slice(0, -4));
	return Promise.all(
		ids
			.sort()
			.reverse()
			.slice(0, limit)
			.map((id) => parse(folder, id))
	);
}

/** One mail, or null when there is none of that id. */
export async function findMailboxMail(folder: string, id: string): Promise<MailboxMail | null> {
	if (!idPattern.test(id)) return null;
	const names = await readdir(folder).catch((): string[] => []);
	return names.includes(`${id}.eml`) ? parse(folder, id) : null;
}
