/** The part of s3rver that is used; the package brings no types. */
declare module 's3rver' {
	import type { Server } from 'node:http';

	export default class S3rver {
		constructor(options: {
			address: string;
			port: number;
			directory: string;
			silent: boolean;
			configureBuckets: { name: string; configs: string[] }[];
		});
		httpServer?: Server;
		middleware: ((
			context: { method: string; url: string; path: string; status: number },
			next: () => Promise<void>
		) => Promise<void>)[];
		run(): Promise<unknown>;
		close(): Promise<void>;
	}
}
