/**
 * Brings a machine that has only Node.js and npm to where TypeScript can run: Debian packages, then the
 * npm packages of the lock file. Plain JavaScript, as nothing is installed before it has run.
 */
import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

/** Debian packages, and how to see that one is there. */
const PACKAGES = {
	postgresql: () =>
		existsSync('/usr/lib/postgresql') && readdirSync('/usr/lib/postgresql').length > 0,
	chromium: () => existsSync('/usr/bin/chromium')
};

/** Debian would set up and run a cluster of the system; ours is private. */
const CLUSTER_CONF = '/etc/postgresql-common/createcluster.conf';
const NO_CLUSTER = 'create_main_cluster = false';

/** @param {(keyof typeof PACKAGES)[]} packages */
export function prepare(packages) {
	process.chdir(fileURLToPath(new URL('../..', import.meta.url)));
	installDebian(packages.filter((name) => !PACKAGES[name]()));
	if (!dependenciesInstalled()) {
		console.log('Installing the npm packages of package-lock.json …');
		run('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error']);
	}
}

/** @param {string[]} missing */
function installDebian(missing) {
	if (missing.length === 0) return;
	if (process.getuid?.() !== 0) {
		console.error(
			`Not installed on this machine: ${missing.join(', ')}. Install with this command, then start again:\n\n` +
				`  sudo sh -c "mkdir -p /etc/postgresql-common && echo '${NO_CLUSTER}' > ${CLUSTER_CONF} && ` +
				`apt-get update && apt-get install -y --no-install-recommends ${missing.join(' ')}"\n`
		);
		process.exit(1);
	}
	console.log(`Installing the Debian packages ${missing.join(', ')} …`);
	if (!existsSync(CLUSTER_CONF)) {
		mkdirSync('/etc/postgresql-common', { recursive: true });
		writeFileSync(CLUSTER_CONF, `${NO_CLUSTER}\n`);
	}
	const keepOurs = ['-o', 'Dpkg::Options::=--force-confold'];
	run('apt-get', ['update', '-qq']);
	run('apt-get', ['install', '-y', '-qq', '--no-install-recommends', ...keepOurs, ...missing]);
}

/** Whether node_modules holds what the lock file says, by npm's own record of what it installed. */
function dependenciesInstalled() {
	const record = 'node_modules/.package-lock.json';
	if (!existsSync(record)) return false;
	const wanted = JSON.parse(readFileSync('package-lock.json', 'utf8')).packages;
	const installed = JSON.parse(readFileSync(record, 'utf8')).packages;
	return Object.keys(wanted).every(
		(path) =>
			path === '' || wanted[path].optional || installed[path]?.version === wanted[path].version
	);
}

/**
 * Quiet unless it fails.
 * @param {string} program
 * @param {string[]} args
 */
function run(program, args) {
	const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
	const outcome = spawnSync(program, args, { env, encoding: 'utf8' });
	if (outcome.status === 0) return;
	console.error(
		`${program} ${args.join(' ')} failed:\n${outcome.stdout ?? ''}${outcome.stderr ?? outcome.error}`
	);
	process.exit(1);
}
