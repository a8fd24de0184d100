/** What the demo runs on: a private PostgreSQL, and the S3 and mail fakes, all in .data on loopback. */
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import pg from 'pg';
import { startMailPage } from '../fakes/mail-page';
import { startS3Fake } from '../fakes/s3';
import { startSmtpFake } from '../fakes/smtp';
import { clusterFolder } from './cluster-folder';
import { DATA, keepEnvironment, keepInstallation, readInstallation } from './installation';
import type { OnEnd } from './launch';
import { migrateDatabase } from './migrate';
import { freePort } from './ports';
import { startCluster } from './postgres';
import { runSeed } from './seed';

const DATABASE = 'holdfast';

export type Services = {
	/** Variables for the process that serves. */
	environment: Record<string, string>;
	mailsAddress: string;
};

/** `engineWorker` is where the server's engine worker is bundled; seeding needs it. */
export async function startServices(engineWorker: string, onEnd: OnEnd): Promise<Services> {
	const installation = await readInstallation(clusterFolder);
	const { postgres, ports } = installation;

	const cluster = await startCluster({ ...postgres, preferredPort: postgres.port, durable: true });
	onEnd(cluster.stop);
	const objects = ownFolder('objects');
	ports.objects = await freePort(ports.objects);
	const store = await startS3Fake(objects, ports.objects, 'evidence');
	onEnd(store.stop);
	ports.smtp = await freePort(ports.smtp);
	const smtp = await startSmtpFake(ports.smtp, ownFolder('mails'));
	onEnd(smtp.stop);
	ports.mails = await freePort(ports.mails);
	const mailPage = await startMailPage(smtp, ports.mails);
	onEnd(mailPage.stop);
	const port = await webPort(ports.web);
	if (!process.env.PORT) ports.web = port;
	postgres.port = cluster.port;
	keepInstallation(installation);

	const environment = {
		...store.environment,
		...smtp.environment,
		...mailPage.environment,
		DATABASE_URL: cluster.url(DATABASE),
		ORIGIN: process.env.ORIGIN ?? `http://localhost:${port}`,
		HOST: process.env.HOST ?? '127.0.0.1',
		PORT: `${port}`,
		ENGINE_WORKER: engineWorker
	};

	keepEnvironment(environment);

	const first = !installation.seeded;
	await makeDatabase(cluster.url('postgres'), first);
	await migrateDatabase(environment.DATABASE_URL);
	if (first) {
		console.log('Writing the demo programmes …');
		await runSeed(environment);
		keepInstallation({ ...installation, seeded: true });
	}

	return {
		environment,
		mailsAddress: mailPage.environment.MAIL_VIEWER_URL!
	};
}

/** A port that was asked for is taken or refused; one of our own choice may move. */
async function webPort(remembered: number): Promise<number> {
	const asked = Number(process.env.PORT ?? 0);
	if (!asked) return freePort(remembered);
	if ((await freePort(asked)) !== asked) throw new Error(`Port ${asked} (PORT) is in use.`);
	return asked;
}

/** What a first start that was broken off has written is thrown away: it is half a demo. */
async function makeDatabase(adminUrl: string, anew: boolean): Promise<void> {
	const client = new pg.Client({ connectionString: adminUrl });
	await client.connect();
	try {
		if (anew) await client.query(`drop database if exists ${DATABASE} with (force)`);
		const { rowCount } = await client.query('select from pg_database where datname = $1', [
			DATABASE
		]);
		if (!rowCount) await client.query(`create database ${DATABASE}`);
	} finally {
		await client.end();
	}
}

function ownFolder(name: string): string {
	const folder = join(DATA, name);
	mkdirSync(folder, { recursive: true, mode: 0o700 });
	return folder;
}
