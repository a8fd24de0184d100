/**
 * What journeys run on: `site`, the production build on a database of its own with the demo programmes
 * and caught mails; `as`, a page of somebody who is signed in.
 */
import {
	test as base,
	expect,
	type BrowserContext,
	type BrowserContextOptions,
	type Page
} from '@playwright/test';
import { startSmtpFake, type CaughtMail } from '../../server/fakes/smtp';
import { address, DEMO_PASSWORD } from '../../server/seed/people';
import { cloneDatabase, dropDatabase } from '../server/database';
import { serve, type Served } from '../setup/serve';
import { DEMO_TEMPLATE } from './global-setup';

export type Site = Served & {
	databaseUrl: string;
	/** Oldest first. */
	mails(to?: string): CaughtMail[];
};

type OfWorker = { site: Site; sessions: Map<string, StorageState> };
type OfTest = {
	/** A new page, in a browser context of its own, of a person by their key in the demo. */
	as(key: string, options?: BrowserContextOptions): Promise<Page>;
};
type StorageState = Awaited<ReturnType<BrowserContext['storageState']>>;

export const test = base.extend<OfTest, OfWorker>({
	site: [
		async ({}, use) => {
			const adminUrl = process.env.TEST_ADMIN_URL!;
			const store = JSON.parse(process.env.TEST_STORE!) as Record<string, string>;
			const database = await cloneDatabase(adminUrl, DEMO_TEMPLATE);
			const smtp = await startSmtpFake(0);
			const served = await serve({
				...store,
				...smtp.environment,
				DATABASE_URL: database.url
			});
			await use({ ...served, databaseUrl: database.url, mails: smtp.mails });
			await served.stop();
			await smtp.stop();
			await dropDatabase(adminUrl, database.name);
		},
		{ scope: 'worker', timeout: 60_000 }
	],
	sessions: [({}, use) => use(new Map()), { scope: 'worker' }],
	baseURL: ({ site }, use) => use(site.origin),
	as: async ({ browser, baseURL, sessions }, use) => {
		const contexts: BrowserContext[] = [];
		await use(async (key, options = {}) => {
			const context = await browser.newContext({
				baseURL,
				storageState: sessions.get(key),
				...options
			});
			contexts.push(context);
			const page = await context.newPage();
			if (!sessions.has(key)) {
				await signIn(page, address(key), DEMO_PASSWORD);
				sessions.set(key, await context.storageState());
			}
			return page;
		});
		for (const context of contexts) await context.close();
	}
});

export { expect };

export async function signIn(page: Page, email: string, password: string): Promise<void> {
	await page.goto('/sign-in');
	await page.getByLabel('Address').fill(email);
	await page.getByLabel('Password', { exact: true }).fill(password);
	await page.getByRole('button', { name: 'Sign in' }).click();
	await page.waitForURL((url) => url.pathname !== '/sign-in');
}
