/** Objects in the S3-compatible store of the settings. */
import { DeleteObjectCommand, GetObjectCommand, NoSuchKey, S3Client } from '@aws-sdk/client-s3';
import { Upload } from '@aws-sdk/lib-storage';
import { Readable } from 'node:stream';
import { settings } from '../settings';

let opened: S3Client | undefined;

function client(): S3Client {
	const { S3_ENDPOINT, S3_REGION, S3_ACCESS_KEY_ID, S3_SECRET_ACCESS_KEY } = settings();
	return (opened ??= new S3Client({
		endpoint: S3_ENDPOINT,
		region: S3_REGION,
		credentials: { accessKeyId: S3_ACCESS_KEY_ID, secretAccessKey: S3_SECRET_ACCESS_KEY },
		forcePathStyle: true,
		// Stores that do not know the newer checksums would keep their trailer as part of the file.
		requestChecksumCalculation: 'WHEN_REQUIRED',
		responseChecksumValidation: 'WHEN_REQUIRED'
	}));
}

/** Streams an object in; when the stream fails, nothing of it stays. */
export async function putObject(key: string, bytes: AsyncIterable<Uint8Array>): Promise<void> {
	const upload = new Upload({
		client: client(),
		params: { Bucket: settings().S3_BUCKET, Key: key, Body: Readable.from(bytes) },
		// At most two parts of 5 MB, the smallest that S3 takes, wait in memory.
		queueSize: 2
	});
	await upload.done();
}

/** Node's web streams can be iterated over; the browser's types do not say so. */
export type Bytes = ReadableStream<Uint8Array> & AsyncIterable<Uint8Array>;

/** The bytes from `first` to `last`, both included; null when the store lacks the object. */
export async function getObject(
	key: string,
	{ first, last }: { first: number; last: number }
): Promise<Bytes | null> {
	try {
		const { Body } = await client().send(
			new GetObjectCommand({
				Bucket: settings().S3_BUCKET,
				Key: key,
				Range: `bytes=${first}-${last}`
			})
		);
		return (Body?.transformToWebStream() as Bytes | undefined) ?? null;
	} catch (error) {
		if (error instanceof NoSuchKey) return null;
		throw error;
	}
}

export async function deleteObject(key: string): Promise<void> {
	await client().send(new DeleteObjectCommand({ Bucket: settings().S3_BUCKET, Key: key }));
}
