import { defineConfig } from '@playwright/test';

export default defineConfig({
	testDir: 'tests/e2e',
	testMatch: '**/*.e2e.ts',
	outputDir: 'test-results/e2e',
	globalSetup: './tests/e2e/global-setup.ts',
	workers: 2,
	projects: [
		{ name: 'journeys', testIgnore: '**/speed.e2e.ts' },
		// What is measured has the machine to itself.
		{ name: 'speed', testMatch: '**/speed.e2e.ts', dependencies: ['journeys'] }
	],
	timeout: 60_000,
	expect: { timeout: 10_000 },
	forbidOnly: true,
	reporter: [['list'], ['json', { outputFile: 'test-results/playwright.json' }]],
	use: {
		viewport: { width: 1440, height: 900 },
		trace: 'retain-on-failure',
		launchOptions: {
			executablePath: '/usr/bin/chromium',
			args: [
				// The browser's sandbox needs an account other than root; only our own pages are opened.
				'--no-sandbox',
				'--disable-gpu',
				'--disable-quic',
				'--no-first-run',
				'--disable-background-networking',
				'--disable-component-update',
				'--disable-sync'
			]
		}
	}
});
