/**
 * A stand-in for the S3-compatible store, for the demo and the tests: files in a folder.
 * It verifies no signatures, so it listens on loopback only and never runs in production.
 */
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
	await server.run();
	return {
		environment: {
			S3_ENDPOINT: `http://127.0.0.1:${port}`,
			S3_REGION: 'us-east-1',
			S3_BUCKET: bucket,
			// The pair that the fake answers to.
			S3_ACCESS_KEY_ID: 'S3RVER',
			S3_SECRET_ACCESS_KEY: 'S3RVER'
		},
		async stop() {
			server.httpServer?.closeAllConnections();
			await server.close();
		}
	};
}
