import { defineConfig, mergeConfig } from 'vitest/config';
import viteConfig from './vite.config.ts';

const properties = 'tests/setup/properties.ts';

const database = {
	globalSetup: ['tests/setup/postgres.ts'],
	setupFiles: [properties, 'tests/server/setup.ts'],
	testTimeout: 20_000,
	hookTimeout: 30_000
};

export default mergeConfig(
	viteConfig,
	defineConfig({
		test: {
			projects: [
				{
					extends: true,
					test: {
						name: 'unit',
						include: ['src/**/*.spec.ts', 'server/**/*.spec.ts'],
						setupFiles: [properties]
					}
				},
				{
					extends: true,
					test: { name: 'reference', include: ['tests/reference/**/*.spec.ts'] }
				},
				{
					extends: true,
					test: { name: 'server', include: ['tests/server/**/*.spec.ts'], ...database }
				},
				{
					extends: true,
					test: {
						name: 'crash',
						include: ['tests/{crash,process}/**/*.spec.ts'],
						...database,
						testTimeout: 120_000
					}
				}
			]
		}
	})
);
