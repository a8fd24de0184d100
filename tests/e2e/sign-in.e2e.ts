import { expect, test } from './harness';

test('somebody who is not signed in is asked to', async ({ page }) => {
	const answer = await page.goto('/programmes');
	expect(answer?.ok()).toBe(true);
	await expect(page).toHaveURL(/\/sign-in/);
	await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible();
});

test('a person of the demo signs in and sees their programmes', async ({ as }) => {
	const page = await as('solvang');
	await page.goto('/programmes');
	await expect(page.getByText('Cordillera Line').first()).toBeVisible();
});

test('nothing on the sign-in page offends the content security policy', async ({ page }) => {
	const complaints: string[] = [];
	page.on('console', (message) => {
		if (message.type() === 'error') complaints.push(message.text());
	});
	page.on('pageerror', (error) => complaints.push(error.message));
	const answer = await page.goto('/sign-in', { waitUntil: 'networkidle' });
	expect(answer?.headers()['content-security-policy']).toContain("frame-ancestors 'none'");
	expect(answer?.headers()['x-content-type-options']).toBe('nosniff');
	expect(complaints).toEqual([]);
});
