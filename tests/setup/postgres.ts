/**
 * Once per run of a project that needs a database: a throw-away cluster with a migrated template, and
 * the S3 fake. Each run has its own, so several can go on at once; what a killed run left is swept.
 */
import { randomBytes } from 'node:crypto';
import { chmod, mkdir, mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pg from 'pg';
import type { TestProject } from 'vitest/node';
import { bundleEngineWorker } from '../../server/engine/bundle';
import { startS3Fake } from '../../server/fakes/s3';
import { migrateDatabase } from '../../server/launch/migrate';
import { freePort } from '../../server/launch/ports';
import { startCluster, stopAbandoned } from '../../server/launch/postgres';
import { processMark, sameProcess } from '../../server/launch/processes';

export const TEMPLATE = 'template_holdfast';
const PREFIX = 'holdfast-test-';

declare module 'vitest' {
	export interface ProvidedContext {
		/** Address of the cluster's `postgres` database. */
		adminUrl: string;
		/** S3_* variables of the fake store. */
		store: Record<string, string>;
		/** Where the fake keeps its files. */
		storeFolder: string;
		/** The bundled worker of the server's engine pool. */
		engineWorker: string;
	}
}

export default async function setup(project: TestProject) {
	const run = await startTestServices();
	project.provide('adminUrl', run.adminUrl);
	project.provide('store', run.store);
	project.provide('storeFolder', run.storeFolder);
	project.provide('engineWorker', run.engineWorker);
	return run.stop;
}

export async function startTestServices() {
	await sweep();
	const folder = await mkdtemp(join(tmpdir(), PREFIX));
	// The account of PostgreSQL passes through; the cluster's own folder is closed.
	await chmod(folder, 0o711);
	await writeFile(join(folder, 'run'), processMark(process.pid));

	const cluster = await startCluster({
		folder: join(folder, 'postgres'),
		password: randomBytes(18).toString('hex'),
		durable: false
	});
	const adminUrl = cluster.url('postgres');
	await execute(adminUrl, `create database ${TEMPLATE}`);
	await migrateDatabase(cluster.url(TEMPLATE));

	const engineWorker = join(folder, 'engine-worker.mjs');
	await bundleEngineWorker(engineWorker);

	const objects = join(folder, 'objects');
	await mkdir(objects);
	const store = await startS3Fake(objects, await freePort(), 'evidence');

	return {
		adminUrl,
		store: store.environment,
		storeFolder: objects,
		engineWorker,
		databaseUrl: cluster.url,
		async stop() {
			await store.stop();
			await cluster.stop();
			await rm(folder, { recursive: true, force: true });
		}
	};
}

/** Ends the clusters of runs that are gone, and removes their folders. */
async function sweep(): Promise<void> {
	const names = (await readdir(tmpdir())).filter((name) => name.startsWith(PREFIX));
	for (const name of names) {
		const folder = join(tmpdir(), name);
		const mark = await readFile(join(folder, 'run'), 'utf8').catch(() => null);
		// Without a mark the run is just starting, or somebody else's that we may not read.
		if (mark === null || sameProcess(mark)) continue;
		await stopAbandoned(join(folder, 'postgres'));
		await rm(folder, { recursive: true, force: true }).catch(() => {});
	}
}

async function execute(url: string, statement: string): Promise<void> {
	const client = new pg.Client({ connectionString: url });
	await client.connect();
	await client.query(statement).finally(() => client.end());
}
