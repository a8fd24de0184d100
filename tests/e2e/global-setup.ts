/** Once a run: the services, and a database with the demo programmes that each worker clones. */
import { startSmtpFake } from '../../server/fakes/smtp';
import { runSeed } from '../../server/launch/seed';
import { cloneDatabase, renameDatabase } from '../server/database';
import { startTestServices } from '../setup/postgres';

export const DEMO_TEMPLATE = 'template_demo';

export default async function setup() {
	const services = await startTestServices();
	const { url, name } = await cloneDatabase(services.adminUrl);
	const smtp = await startSmtpFake(0);
	await runSeed({
		...services.store,
		...smtp.environment,
		DATABASE_URL: url,
		ORIGIN: 'http://localhost',
		ENGINE_WORKER: 'build/engine-worker.js'
	});
	await smtp.stop();
	await renameDatabase(services.adminUrl, name, DEMO_TEMPLATE);

	// Workers are processes of their own and inherit the environment.
	process.env.TEST_ADMIN_URL = services.adminUrl;
	process.env.TEST_STORE = JSON.stringify(services.store);
	return services.stop;
}
