import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { z } from 'zod';

const url = (protocols: string[]) =>
	z.string().refine((text) => URL.canParse(text) && protocols.includes(new URL(text).protocol), {
		message: `must be a URL starting with ${protocols.map((p) => `${p}//`).join(' or ')}`
	});

const settings = z.object({
	PORT: z.coerce.number().int().min(1).max(65_535).default(3000),
	HOST: z.string().default('127.0.0.1'),
	WHARFINGER_DATA: z.string().default('.data'),
	DATABASE_URL: url(['mariadb:', 'mysql:']),
	DATABASE_OWNER_URL: url(['mariadb:', 'mysql:']).optional(),
	SMTP_URL: url(['smtp:', 'smtps:']).optional(),
	LOCAL_MAILBOX_PORT: z.coerce.number().int().optional(),
	MAIL_FROM: z.string().default('notices@wharfinger.example'),
	ORIGIN: url(['http:', 'https:']).optional(),
	AUTH_SECRET: z.string().min(32, 'must have at least 32 characters').optional(),
	TRUST_PROXY: z.enum(['true', 'false']).default('false'),
	STORAGE: z.enum(['folder', 's3']).default('folder'),
	S3_BUCKET: z.string().optional(),
	S3_ENDPOINT: url(['http:', 'https:']).optional(),
	S3_REGION: z.string().default('us-east-1'),
	TIMESTAMP_URL: url(['http:', 'https:']).optional(),
	CERTIFICATE_PASSPHRASE: z.string().optional(),
	LOG_LEVEL: z.enum(['trace', 'debug', 'info', 'warn', 'error', 'fatal', 'silent']).default('info'),
	IS_DEMO: z.enum(['true', 'false']).default('false')
});

export interface Env {
	port: number;
	host: string;
	dataFolder: string;
	databaseUrl: string;
	databaseOwnerUrl: string;
	/** Where mail goes: the configured server, or the local stand-in. */
	smtpUrl: string;
	/** True while mail goes to the local stand-in, whose mailbox the app shows. */
	isLocalMailbox: boolean;
	mailFrom: string;
	/** Public address, without a trailing slash. Links in mail start with it, never with a request's Host. */
	origin: string;
	authSecret: string;
	isProxyTrusted: boolean;
	storage:
		| { kind: 'folder'; folder: string }
		| { kind: 's3'; bucket: string; endpoint: string | null; region: string };
	keysFolder: string;
	mailFolder: string;
	certificatePassphrase: string;
	/** RFC 3161 authority that stamps each seal; null asks none. */
	timestampUrl: string | null;
	logLevel: string;
	isDemo: boolean;
}

/** A secret of this installation, made once and kept readable to its owner only. */
function keptSecret(folder: string, name: string): string {
	const path = join(folder, name);
	mkdirSync(folder, { recursive: true, mode: 0o700 });
	if (!existsSync(path))
		writeFileSync(path, randomBytes(32).toString('base64url'), { mode: 0o600, flag: 'wx' });
	return readFileSync(path, 'utf8').trim();
}

/** Reads the settings. @throws Error naming every fault at once. */
export function readEnv(source: Record<string, string | undefined>): Env {
	const given = Object.fromEntries(
		Object.entries(source).filter(([, value]) => value !== undefined && value !== '')
	);
	const parsed = settings.safeParse(given);
	if (!parsed.success) {
		const faults = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
		throw new Error(`The settings have ${faults.length} fault(s):\n${faults.join('\n')}\nSee .env.example.`);
	}
	const env = parsed.data;
	if (env.STORAGE === 's3' && !env.S3_BUCKET)
		throw new Error(
			'The settings have 1 fault(s):\n  S3_BUCKET: is needed when STORAGE is s3\nSee .env.example.'
		);

	const dataFolder = resolve(env.WHARFINGER_DATA);
	const keysFolder = join(dataFolder, 'keys');
	return {
		port: env.PORT,
		host: env.HOST,
		dataFolder,
		databaseUrl: env.DATABASE_URL,
		databaseOwnerUrl: env.DATABASE_OWNER_URL ?? env.DATABASE_URL,
		smtpUrl: env.SMTP_URL ?? `smtp://127.0.0.1:${env.LOCAL_MAILBOX_PORT ?? env.PORT + 2}`,
		isLocalMailbox: !env.SMTP_URL,
		mailFrom: env.MAIL_FROM,
		origin: (env.ORIGIN ?? source.PUBLIC_ORIGIN ?? `http://localhost:${env.PORT}`).replace(/\/$/, ''),
		authSecret: env.AUTH_SECRET ?? keptSecret(keysFolder, 'auth-secret'),
		isProxyTrusted: env.TRUST_PROXY === 'true',
		storage:
			env.STORAGE === 's3'
				? {
						kind: 's3',
						bucket: env.S3_BUCKET ?? '',
						endpoint: env.S3_ENDPOINT ?? null,
						region: env.S3_REGION
					}
				: { kind: 'folder', folder: join(dataFolder, 'files') },
		keysFolder,
		mailFolder: join(dataFolder, 'mail'),
		certificatePassphrase: env.CERTIFICATE_PASSPHRASE ?? keptSecret(keysFolder, 'certificate-passphrase'),
		timestampUrl: env.TIMESTAMP_URL ?? null,
		logLevel: env.LOG_LEVEL,
		isDemo: env.IS_DEMO === 'true'
	};
}

let current: Env | null = null;

/** The settings of this process, read once. */
export function env(): Env {
	current ??= readEnv(process.env);
	return current;
}
