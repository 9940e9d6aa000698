import { createReadStream } from 'node:fs';
import { Readable } from 'node:stream';
import {
	DeleteObjectCommand,
	GetObjectCommand,
	HeadObjectCommand,
	PutObjectCommand,
	S3Client
} from '@aws-sdk/client-s3';
import { stat } from 'node:fs/promises';
import type { Store } from './store';

interface Bucket {
	bucket: string;
	endpoint: string | null;
	region: string;
}

/** A bucket of an S3-compatible service; credentials come from the SDK's usual places. */
export function s3Store({ bucket, endpoint, region }: Bucket): Store {
	const client = new S3Client({ region, ...(endpoint ? { endpoint, forcePathStyle: true } : {}) });
	const key = (sha256: string) => `files/${sha256.slice(0, 2)}/${sha256}`;

	async function isStored(sha256: string): Promise<boolean> {
		try {
			await client.send(new HeadObjectCommand({ Bucket: bucket, Key: key(sha256) }));
			return true;
		} catch (error) {
			if (error instanceof Error && error.name === 'NotFound') return false;
			throw error;
		}
	}

	async function openObject(sha256: string): Promise<Readable> {
		const { Body } = await client.send(new GetObjectCommand({ Bucket: bucket, Key: key(sha256) }));
		if (!(Body instanceof Readable)) throw new Error(`The bucket gave no stream for ${sha256}.`);
		return Body;
	}

	return {
		async put(sha256, bytes) {
			if (await isStored(sha256)) return;
			await client.send(new PutObjectCommand({ Bucket: bucket, Key: key(sha256), Body: bytes }));
		},
		async putFile(sha256, path) {
			if (await isStored(sha256)) return;
			const { size } = await stat(path);
			await client.send(
				new PutObjectCommand({
					Bucket: bucket,
					Key: key(sha256),
					Body: createReadStream(path),
					ContentLength: size
				})
			);
		},
		async read(sha256) {
			const chunks: Buffer[] = [];
			for await (const chunk of await openObject(sha256)) chunks.push(Buffer.from(chunk));
			return Buffer.concat(chunks);
		},
		open: openObject,
		async remove(sha256) {
			await client.send(new DeleteObjectCommand({ Bucket: bucket, Key: key(sha256) }));
		}
	};
}
