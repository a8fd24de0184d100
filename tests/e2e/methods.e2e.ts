import { spawnSync } from 'node:child_process';
import { expect, test } from './harness';

test('a method is found, tried with a wrong figure, and gives its result', async ({ as }) => {
	const page = await as('lindqvist');
	await page.goto('/programmes');
	await page.getByRole('link', { name: 'Methods' }).click();
	await page.getByRole('link', { name: 'Line of uniform section' }).click();
	const form = page.getByRole('form');
	await form.getByLabel('density').fill('-7900');
	await form.getByLabel('stress of the material').fill('5,0');
	await form.getByRole('button', { name: 'Compute' }).click();
	await expect(form).toContainText('Write 5.0.');
	await form.getByLabel('stress of the material').fill('5');
	await form.getByRole('button', { name: 'Compute' }).click();
	await expect(form).toContainText('Must be above 0.');

	await form.getByLabel('density').fill('7900');
	await form.getByRole('button', { name: 'Compute' }).click();
	// 382.5 GPa at 7900 kg/m³ on Earth: consistency figure computed outside with SciPy.
	await expect(page.getByRole('row', { name: /greatest stress/ })).toContainText('382.5');
	// 5 GPa / (7900 kg/m³ × 9.80665 m/s²) = 64.54 km, by hand.
	await expect(page.getByRole('row', { name: /breaking length/ })).toContainText('64.53');
});

test('figures are typed with units, results of earlier inputs say so, and the address opens the same computation', async ({
	as
}) => {
	const page = await as('lindqvist');
	await page.goto('/methods/uniform-line');
	const form = page.getByRole('form');
	await form.getByLabel('density').fill('7.9 g/cm³');
	await form.getByLabel('stress of the material').fill('5 kg');
	await form.getByRole('button', { name: 'Compute' }).click();
	await expect(form).toContainText('kg is a unit of a mass');
	await expect(form.getByLabel('stress of the material')).toBeFocused();
	await form.getByLabel('stress of the material').fill('5000 MPa');
	await form.getByRole('button', { name: 'Compute' }).click();
	const greatest = page.getByRole('row', { name: /greatest stress/ });
	await expect(greatest).toContainText('382.5');
	await expect(page.getByRole('slider', { name: /over radius, km/ })).toBeVisible();

	const download = page.waitForEvent('download');
	await page.getByRole('button', { name: 'Results as CSV' }).click();
	expect((await download).suggestedFilename()).toBe('uniform-line.csv');

	const colleague = await as('haddad');
	await colleague.goto(page.url());
	await expect(colleague.getByRole('form').getByLabel('density')).toHaveValue('7.9 g/cm³');
	await expect(colleague.getByRole('row', { name: /greatest stress/ })).toContainText('382.5');

	await form.getByLabel('density').fill('1300');
	await expect(page.getByText('belong to the inputs as they were')).toBeVisible();
	await form.getByRole('button', { name: 'Compute' }).click();
	await expect(greatest).not.toContainText('382.5');
	await expect(page.getByText('belong to the inputs as they were')).toHaveCount(0);
});

test('a token is made, asks the API, and opens nothing once it is revoked', async ({
	as,
	site
}) => {
	const page = await as('lindqvist');
	await page.goto('/account');
	await page.getByLabel('What it is for').fill('sizing script');
	await page.getByRole('button', { name: 'Make a token' }).click();
	const token = await page.locator('[data-token]').textContent();
	const ask = () =>
		fetch(`${site.origin}/api/v1/methods/uniform-line`, {
			method: 'POST',
			headers: { authorization: `Bearer ${token}`, 'content-type': 'application/json' },
			body: JSON.stringify({ site: { kind: 'body', body: 'earth' }, density: 7900, stress: 5e9 })
		});
	const answer = await ask();
	expect(answer.status).toBe(200);
	const { outputs, engine } = await answer.json();
	expect(outputs.peakStress / 1e9).toBeCloseTo(382.5, 1);

	// The same on the command line, to the last digit.
	const input = JSON.stringify({
		site: { kind: 'body', body: 'earth' },
		density: 7900,
		stress: 5e9
	});
	const command = spawnSync('npm', ['run', '-s', 'method', '--', 'uniform-line', '-'], {
		input,
		encoding: 'utf8'
	});
	expect(command.status).toBe(0);
	expect(JSON.parse(command.stdout)).toMatchObject({ engine, outputs });

	await page.reload();
	await expect(page.locator('[data-token]')).toHaveCount(0);
	await page.getByRole('button', { name: 'Revoke sizing script' }).click();
	await expect(page.getByText('sizing script')).toHaveCount(0);
	expect((await ask()).status).toBe(401);
});
