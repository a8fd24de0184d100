/**
 * A stand-in for the S3-compatible store, for the demo and the tests: files in a folder.
 * It verifies no signatures, so it listens on loopback only and never runs in production.
 */
import { rm } from 'node:fs/promises';
import { basename, join } from 'node:path';
import S3rver from 's3rver';

export type S3Fake = { environment: Record<string, string>; stop(): Promise<void> };

export async function startS3Fake(folder: string, port: number, bucket: string): Promise<S3Fake> {
	const server = new S3rver({
		address: '127.0.0.1',
		port,
		directory: folder,
		silent: true,
		configureBuckets: [{ name: bucket, configs: [] }]
	});
	server.middleware.unshift(abortMultipartUpload(folder));
	await server.run();
	return {
		environment: {
			S3_ENDPOINT: `http://127.0.0.1:${port}`,
			S3_REGION: 'us-east-1',
			S3_BUCKET: bucket,
			// The pair that the fake answers to.
			S3_ACCESS_KEY_ID: 'S3RVER',
			S3_SECRET_ACCESS_KEY: 'S3RVER',
			// The SDK's forecast about versions of Node.js is for maintainers, not for who starts the demo.
			AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true'
		},
		async stop() {
			server.httpServer?.closeAllConnections();
			await server.close();
		}
	};
}

/** AbortMultipartUpload, which s3rver does not answer: forgets the parts of an upload. */
function abortMultipartUpload(folder: string): S3rver['middleware'][number] {
	return async (context, next) => {
		const id = new URL(context.url, 'http://fake').searchParams.get('uploadId');
		if (context.method !== 'DELETE' || !id) return next();
		const bucket = basename(context.path.split('/')[1] ?? '');
		await rm(join(folder, bucket, '._S3rver_uploads', basename(id)), { recursive: true });
		context.status = 204;
	};
}
