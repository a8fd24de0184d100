/** What this checkout remembers between starts: ports and passwords, in .data, for its owner only. */
import { randomBytes } from 'node:crypto';
import { chmodSync, existsSync, mkdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';

export const DATA = resolve('.data');
const FILE = join(DATA, 'installation.json');

export type Installation = {
	postgres: { folder: string; password: string; port: number };
	ports: { web: number; objects: number; smtp: number; mails: number };
	/** Whether the demo programmes were written whole. */
	seeded: boolean;
};

const DEFAULT_PORTS: Installation['ports'] = { web: 4270, objects: 4271, smtp: 4272, mails: 4273 };

export async function readInstallation(
	clusterFolder: () => Promise<string>
): Promise<Installation> {
	makeDataFolder();
	if (existsSync(FILE)) return JSON.parse(readFileSync(FILE, 'utf8')) as Installation;
	const password = randomBytes(24).toString('hex');
	const installation: Installation = {
		postgres: { folder: await clusterFolder(), password, port: 5432 },
		ports: DEFAULT_PORTS,
		seeded: false
	};
	// Before the cluster is made with it: a password that is lost locks us out.
	keepInstallation(installation);
	return installation;
}

export function keepInstallation(installation: Installation): void {
	writeFileSync(FILE, JSON.stringify(installation, null, '\t'), { mode: 0o600 });
}

/** For programs that are run beside `npm start` and have no environment of their own. */
export function keepEnvironment(environment: Record<string, string>): void {
	writeFileSync(join(DATA, 'environment.json'), JSON.stringify(environment), { mode: 0o600 });
}

export function makeDataFolder(): void {
	mkdirSync(DATA, { recursive: true });
	if (statSync(DATA).uid !== process.getuid?.())
		throw new Error(`${DATA} belongs to another account: start as that account, or move it away.`);
	// The account that runs PostgreSQL passes through to its own folder and can list nothing.
	chmodSync(DATA, 0o711);
}
