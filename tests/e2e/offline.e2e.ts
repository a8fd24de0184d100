import { expect, test } from './harness';
import { field, openNote, readyForOffline, row, saved, value } from './note-page';

test('edits go on without a connection, survive a reload, and merge when it is back', async ({
	as
}) => {
	const lindqvist = await as('lindqvist');
	const quispe = await as('quispe');
	await openNote(lindqvist, 'ML-DN-002');
	await openNote(quispe, 'ML-DN-002');

	await readyForOffline(lindqvist);
	await lindqvist.context().setOffline(true);
	await expect(saved(lindqvist)).toContainText('Offline');
	const rho = await field(lindqvist, 'ml2-rho', 'Value');
	await rho.fill('1600');
	await rho.press('Enter');
	// Results follow without the server: exp(1600 × 2.697668e6 / 1.90625e9) = 9.624
	await expect(value(lindqvist, 'ml2-taper')).toHaveText('9.624');
	await expect(saved(lindqvist)).toContainText(/Offline, \d+ edits? not saved/);

	// Somebody else goes on meanwhile.
	const fs = await field(quispe, 'ml2-fs', 'Value');
	await fs.fill('1.7');
	await fs.press('Enter');
	await expect(value(quispe, 'ml2-rho')).toHaveText(/1.560/);
	await expect(saved(quispe)).toContainText('Saved');

	await lindqvist.context().setOffline(false);
	await expect(saved(lindqvist)).toContainText('Saved', { timeout: 20_000 });
	// σ_d = 3.05/1.7 GPa: exp(1600 × 2.69767e6 / 1.79412e9) = 11.087, the same for both
	await expect(value(lindqvist, 'ml2-taper')).toHaveText(/11\.0[89]/);
	await expect(value(quispe, 'ml2-taper')).toHaveText(/11\.0[89]/);
	await quispe.reload();
	await expect(row(quispe, 'ml2-rho')).toContainText(/1.600/);
});

test('edits that a closed page never sent are counted and sent when the note is opened again', async ({
	as
}) => {
	const page = await as('abara');
	await openNote(page, 'CL-DN-006');
	await readyForOffline(page);
	await page.context().setOffline(true);
	await expect(saved(page)).toContainText('Offline');
	const width = await field(page, 'cl6-width', 'Value');
	await width.fill('0.16');
	await width.press('Enter');
	await expect(saved(page)).toContainText(/edits? not saved/);
	await page.close({ runBeforeUnload: false });

	const again = await page.context().newPage();
	await again.context().setOffline(false);
	await openNote(again, 'CL-DN-006');
	await expect(value(again, 'cl6-width')).toHaveText('0.16');
	const elsewhere = await as('quispe');
	await openNote(elsewhere, 'CL-DN-006');
	await expect(value(elsewhere, 'cl6-width')).toHaveText('0.16');
});

test('text is edited without a connection, although its editor was never opened before', async ({
	as
}) => {
	const page = await as('quispe');
	await openNote(page, 'CL-DN-005');
	await readyForOffline(page);
	await page.context().setOffline(true);
	await expect(saved(page)).toContainText('Offline');
	await row(page, 'cl5-why').focus();
	await page.keyboard.press('Enter');
	const editor = row(page, 'cl5-why').locator('[contenteditable="true"]');
	await editor.click();
	await page.keyboard.press('Control+End');
	await page.keyboard.type(' Written at sea.');
	await page.context().setOffline(false);
	await expect(saved(page)).toContainText('Saved', { timeout: 20_000 });
	const other = await as('laine');
	await openNote(other, 'CL-DN-005');
	await expect(row(other, 'cl5-why')).toContainText('Written at sea.');
});

test('edits by somebody who has lost the role meanwhile are not taken, and not lost', async ({
	as
}) => {
	const abara = await as('abara');
	const solvang = await as('solvang');
	await openNote(abara, 'ML-DN-001');
	await readyForOffline(abara);
	await abara.context().setOffline(true);
	await expect(saved(abara)).toContainText('Offline');
	const speed = await field(abara, 'ml1-piece', 'Value');
	await speed.fill('21');
	await speed.press('Enter');

	await solvang.goto('/programmes/ML/people');
	await solvang.getByRole('link', { name: 'Change N. Abara' }).click();
	await solvang.getByRole('combobox', { name: 'Role' }).selectOption('reviewer');
	await solvang.getByRole('button', { name: 'Change', exact: true }).click();
	await expect(solvang.getByRole('row', { name: /^N. Abara/ })).toContainText('reviewer');

	await abara.context().setOffline(false);
	await expect(abara.getByRole('alert')).toContainText('was not taken', { timeout: 20_000 });
	await expect(abara.getByRole('link', { name: 'N. Abara, reviewer' })).toBeVisible();
	await expect(abara.getByText('Change the title block')).toHaveCount(0);
	await abara.getByRole('button', { name: /^Copy the/ }).click();
	await expect(abara.getByLabel('Edits that were not taken')).toHaveValue(/21/);
	await openNote(solvang, 'ML-DN-001');
	await expect(value(solvang, 'ml1-piece')).not.toHaveText('21');

	await abara.getByRole('button', { name: /^Drop/ }).click();
	await expect(saved(abara)).toContainText('Saved');
	await expect(value(abara, 'ml1-piece')).not.toHaveText('21');
});
