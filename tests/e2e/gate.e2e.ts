import { spawnSync } from 'node:child_process';
import { expect, test } from './harness';
import { field, openNote, row, saved, value } from './note-page';

const NOTE = '/programmes/CL/notes/CL-DN-004';
const WAIVER = 'The joints are thickened before CDR; none is made before then.';

test('a note is refused at the gate, cleared, waived, frozen, verified and compared', async ({
	as,
	site
}) => {
	test.setTimeout(120_000);
	const solvang = await as('solvang');
	const abara = await as('abara');

	// What cannot be computed stands in the way and no waiver is offered for it.
	await solvang.goto(`${NOTE}/freeze`);
	await expect(solvang.getByRole('heading', { name: /in the way/ })).toBeVisible();
	await expect(solvang.getByText('No waiver can stand in').first()).toBeVisible();
	const freeze = solvang.getByRole('button', { name: /Freeze baseline B/ });
	await expect(freeze).toBeDisabled();

	await openNote(abara, 'CL-DN-004');
	const flux = await field(abara, 'cl4-flux', 'Value');
	await flux.fill('1e-9');
	await flux.press('Enter');
	// Λ = 1e-9 /(m² yr) × 0.14 m × 2000 km = 2.8e-4 /yr; 1 − exp(−2.8e-3) = 0.0028 ≤ 0.010
	await expect(row(abara, 'cl4-c-cut')).toContainText('holds');
	await expect(saved(abara)).toContainText('Saved');

	await solvang.goto(`${NOTE}/freeze`);
	await expect(freeze).toBeDisabled();
	await solvang.getByLabel(/Waiver: why 4.3/).fill(WAIVER);
	await solvang.getByRole('button', { name: 'Freeze baseline B' }).click();
	await solvang.waitForURL(/\/baselines\//);
	const sheet = solvang.getByRole('main');
	await expect(sheet).toContainText(WAIVER);
	await expect(solvang.getByRole('status').first()).toContainText('Sealed');
	await expect(row(solvang, 'cl4-c-joint')).toContainText('fails');

	await solvang.getByRole('button', { name: 'Verify' }).click();
	await expect(sheet).toContainText(/Recomputed, all \d+ quantities agree/);
	const atTerminal = spawnSync('npm', ['run', '-s', 'verify-baseline', '--', 'CL-DN-004/B'], {
		encoding: 'utf8',
		env: { ...process.env, ...site.environment }
	});
	expect(atTerminal.stdout + atTerminal.stderr).toContain('holds');
	expect(atTerminal.status).toBe(0);

	// The team hears of it.
	await expect
		.poll(
			() =>
				site
					.mails('nwosu@halden.example')
					.map(({ subject }) => subject)
					.join('\n'),
			{
				timeout: 15_000
			}
		)
		.toContain('CL-DN-004');

	// Work goes on in the next revision, and what changes since is marked.
	await openNote(abara, 'CL-DN-004');
	await expect(abara.getByText('As frozen in baseline B')).toBeVisible();
	const top = await field(abara, 'cl4-top', 'Value');
	await top.fill('90000');
	await top.press('Enter');
	await expect(row(abara, 'cl4-top')).toContainText(/88.000/);
	await expect(abara.getByRole('button', { name: /changed/ })).toBeVisible();
	const why = row(abara, 'cl4-why');
	await expect(why.locator('ins')).toHaveCount(0);
	await why.focus();
	await abara.keyboard.press('Enter');
	await why.getByRole('textbox').press('Control+End');
	await abara.keyboard.type(' Checked once more.');
	await abara.keyboard.press('Control+Enter');
	await expect(why).toContainText('3 words new');
	await expect(why.locator('ins')).toHaveText('Checked once more.');
	await expect(saved(abara)).toContainText('Saved');

	await abara.goto(`${NOTE}/compare?from=B&to=now`);
	const top88 = abara.getByRole('row', { name: /Top of the line above sea level/ });
	// 90 000 / 88 000 − 1 = +2.3 %
	await expect(top88).toContainText('+2.3');
	await abara.goto(`${NOTE}/compare?from=A&to=B`);
	await expect(abara.getByRole('main')).toContainText('Thickening at a joint');
});

test('two leads who freeze at once get one baseline and one clear refusal', async ({ as }) => {
	const one = await as('solvang');
	const other = await as('solvang');
	const at = '/programmes/CL/notes/CL-DN-001/freeze';
	await one.goto(at);
	await other.goto(at);
	const press = { name: 'Freeze baseline B' };
	await Promise.all([
		one.getByRole('button', press).click(),
		other.getByRole('button', press).click()
	]);
	await expect
		.poll(async () => {
			const texts = await Promise.all([one, other].map((page) => page.locator('body').innerText()));
			const frozen = [one, other].filter((page) => /\/baselines\//.test(page.url())).length;
			const refused = texts.filter((text) => text.includes('is frozen already')).length;
			return { frozen, refused };
		})
		.toEqual({ frozen: 1, refused: 1 });
});

test('a given is taken from the baseline of another note, and flagged when a newer one changes it', async ({
	as
}) => {
	test.setTimeout(120_000);
	const solvang = await as('solvang');
	const abara = await as('abara');
	const laine = await as('laine');
	for (const page of [abara, laine]) await openNote(page, 'CL-DN-006');
	const taken = row(abara, 'cl6-flux');
	await field(abara, 'cl6-flux', 'Value');
	await taken.getByRole('searchbox').fill('greatest speed tape');
	await taken.getByRole('button', { name: /Greatest speed on the tape/ }).click();
	await expect(taken.getByLabel('Value', { exact: true })).toHaveValue('200');
	await expect(taken.getByLabel('Unit')).toHaveValue('km/h');
	await expect(taken.getByLabel('Source')).toHaveValue('CL-DN-003 baseline A, 2.4');
	await taken.getByLabel('Source').press('Enter');
	await expect(row(laine, 'cl6-flux')).toContainText('CL-DN-003 baseline A, 2.4');
	await expect(saved(abara)).toContainText('Saved');

	// The other note goes on, and its next baseline says otherwise.
	await openNote(solvang, 'CL-DN-003');
	const speed = await field(solvang, 'cl3-vmax', 'Value');
	await speed.fill('190');
	await speed.press('Enter');
	await expect(saved(solvang)).toContainText('Saved');
	await solvang.goto('/programmes/CL/notes/CL-DN-003/freeze');
	await solvang.getByRole('button', { name: 'Freeze baseline B' }).click();
	await solvang.waitForURL(/\/baselines\//);
	await solvang.goto('/programmes/CL/parameters');
	await solvang.getByRole('searchbox').fill('greatest speed tape');
	await expect(solvang.getByRole('row', { name: /Greatest speed on the tape/ })).toContainText(
		'190'
	);

	for (const page of [abara, laine]) {
		await page.reload();
		await expect(row(page, 'cl6-flux')).toContainText(/baseline B has 190.*km\/h here/);
	}
	// Who only reads is told and has nothing to press.
	await expect(row(laine, 'cl6-flux').getByRole('button', { name: 'Take' })).toHaveCount(0);
	await row(abara, 'cl6-flux').getByRole('button', { name: 'Take the new value' }).click();
	await expect(value(abara, 'cl6-flux')).toHaveText('190');
	await expect(row(abara, 'cl6-flux')).toContainText('CL-DN-003 baseline B, 2.4');
	await expect(row(laine, 'cl6-flux')).not.toContainText('is frozen anew');
});
