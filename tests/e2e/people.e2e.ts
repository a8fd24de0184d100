import type { Page } from '@playwright/test';
import { DEMO_PASSWORD } from '../../server/seed/people';
import { expect, signIn, test, type Site } from './harness';

/** The newest link of its kind that somebody was sent; other journeys mail the same people. */
async function linkMailedTo(site: Site, to: string, kind: 'invitation' | 'reset'): Promise<string> {
	const link = new RegExp(`https?://\\S+/${kind}/\\S+`);
	const newest = () =>
		site
			.mails(to)
			.flatMap(({ text }) => link.exec(text)?.[0] ?? [])
			.at(-1) ?? '';
	await expect.poll(newest, { timeout: 15_000 }).toContain(site.origin);
	return newest();
}

const mayWrite = (page: Page) => page.getByText(/^New note, CL-DN-/);

test('somebody is invited by mail, enters, works in the role given, and loses it when it is changed', async ({
	as,
	site,
	browser,
	baseURL
}) => {
	const solvang = await as('solvang');
	await solvang.goto('/programmes/CL/people');
	await solvang.getByLabel('Address').fill('ferrand@kelda.example');
	await solvang.getByRole('button', { name: 'Invite as engineer' }).click();
	await expect(solvang.getByRole('main')).toContainText('ferrand@kelda.example');

	const link = await linkMailedTo(site, 'ferrand@kelda.example', 'invitation');
	const page = await (await browser.newContext({ baseURL })).newPage();
	await page.goto(link);
	await expect(page.getByRole('heading', { level: 1 })).toContainText('Cordillera Line');
	await page.getByLabel('Name').fill('C. Ferrand');
	await page.getByLabel('Password', { exact: true }).fill('debris met at dawn');
	await page.getByRole('button', { name: /Accept/ }).click();
	await page.waitForURL(/programmes\/CL/);
	await expect(mayWrite(page)).toBeVisible();

	// The link works once.
	const second = await (await browser.newContext({ baseURL })).newPage();
	await second.goto(link);
	await expect(second.getByLabel('Name')).toHaveCount(0);

	await solvang.reload();
	await solvang.getByRole('link', { name: 'Change C. Ferrand' }).click();
	await solvang.getByRole('combobox', { name: 'Role' }).selectOption('observer');
	await solvang.getByRole('button', { name: 'Change', exact: true }).click();
	await expect(solvang.getByRole('row', { name: /^C. Ferrand ferrand/ })).toContainText('observer');
	await page.reload();
	await expect(page.getByRole('main')).toContainText('CL-DN-001');
	await expect(mayWrite(page)).toHaveCount(0);
	await page.context().close();
	await second.context().close();
});

test('a forgotten password is set anew by mail, once, and says the same for every address', async ({
	site,
	browser,
	baseURL
}) => {
	const page = await (await browser.newContext({ baseURL })).newPage();
	const says = async (address: string) => {
		await page.goto('/reset');
		await page.getByLabel('Address').fill(address);
		await page.getByRole('button').first().click();
		return page.getByText(/If there is an account/).innerText();
	};
	const known = await says('cordeiro@halden.example');
	expect(await says('nobody@halden.example')).toBe(known);
	expect(site.mails('nobody@halden.example')).toEqual([]);

	const link = await linkMailedTo(site, 'cordeiro@halden.example', 'reset');
	await page.goto(link);
	await page
		.getByLabel(/password/i)
		.first()
		.fill('nine strands of rope');
	await page.getByRole('button', { name: /Set it/ }).click();
	await page.waitForURL((url) => !url.pathname.startsWith('/reset'));
	const again = await (await browser.newContext({ baseURL })).newPage();
	await again.goto(link);
	await expect(again.getByRole('button', { name: /Set it/ })).toHaveCount(0);
	await signIn(again, 'cordeiro@halden.example', 'nine strands of rope');
	await expect(again.getByRole('main')).toContainText('Cordillera Line');
	await page.context().close();
	await again.context().close();
});

test('five wrong passwords close the door for a while, to that account only', async ({
	browser,
	baseURL,
	as
}) => {
	const page = await (await browser.newContext({ baseURL })).newPage();
	await page.goto('/sign-in');
	for (let tries = 0; tries < 5; tries++) {
		await page.getByLabel('Address').fill('abara@halden.example');
		await page.getByLabel('Password', { exact: true }).fill(`not it ${tries}`);
		// What the try before was told still stands on the page.
		const answered = page.waitForResponse((response) => response.request().method() === 'POST');
		await page.getByRole('button', { name: 'Sign in' }).click();
		await answered;
		await expect(page.getByRole('main')).toContainText(/Not signed in|Too many tries/);
	}
	await page.goto('/sign-in');
	await page.getByLabel('Address').fill('abara@halden.example');
	await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
	await page.getByRole('button', { name: 'Sign in' }).click();
	await expect(page.getByRole('main')).toContainText('Too many tries');
	await page.context().close();
	const other = await as('lindqvist');
	await other.goto('/');
	await expect(other.getByRole('main')).toContainText('Cordillera Line');
});
