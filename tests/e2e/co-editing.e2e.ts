import { expect, test } from './harness';
import { field, itemCount, openNote, row, saved, value } from './note-page';

test('two people write one calculation at once; both see every keystroke and the result', async ({
	as
}) => {
	const abara = await as('abara');
	const quispe = await as('quispe');
	await openNote(abara, 'CL-DN-003');
	await openNote(quispe, 'CL-DN-003');

	// 2 × 14 t × 7.292115e-5 rad/s × 200 km/h = 113.43 N (METHODS-independent: by hand)
	await expect(value(abara, 'cl3-side')).toHaveText('113.4');

	const one = await field(abara, 'cl3-side', 'Expression');
	const other = await field(quispe, 'cl3-side', 'Expression');
	await one.press('End');
	await one.pressSequentially(' * 1.5');
	await other.press('Home');
	await other.pressSequentially('1 * ');
	const both = '1 * 2 m_lift earth.rate v_max * 1.5';
	await expect(one).toHaveValue(both);
	await expect(other).toHaveValue(both);
	// Each sees the other's caret and name in the field, and who types where in the masthead.
	await expect(row(abara, 'cl3-side').locator('[data-name="M. Quispe"]')).toHaveCount(1);
	await expect(abara.getByLabel('On this note now')).toContainText('M. Quispe 3.5');

	await one.press('Enter');
	await other.press('Enter');
	await expect(value(abara, 'cl3-side')).toHaveText('170.1');
	await expect(value(quispe, 'cl3-side')).toHaveText('170.1');
	await expect(saved(abara)).toContainText('Saved');

	// 170.1 N leaves 180/170.1 − 1 = 0.058: thin below the note's 0.10.
	await expect(row(quispe, 'cl3-c-side')).toContainText('thin');
});

test('undo takes back one’s own edits and leaves the other’s', async ({ as }) => {
	const abara = await as('abara');
	const quispe = await as('quispe');
	await openNote(abara, 'ML-DN-001');
	await openNote(quispe, 'ML-DN-001');

	const speed = await field(abara, 'ml1-speed', 'Value');
	await speed.fill('130');
	await speed.press('Enter');
	await expect(value(quispe, 'ml1-speed')).toHaveText('130');
	const piece = await field(quispe, 'ml1-piece', 'Value');
	await piece.fill('19');
	await piece.press('Enter');
	await expect(value(abara, 'ml1-piece')).toHaveText('19');

	await row(abara, 'ml1-lift').focus();
	await abara.keyboard.press('Control+z');
	await expect(value(abara, 'ml1-speed')).toHaveText('120');
	await expect(value(quispe, 'ml1-speed')).toHaveText('120');
	await expect(value(abara, 'ml1-piece')).toHaveText('19');
});

test('items are added, moved, duplicated, removed and put back by keyboard', async ({ as }) => {
	const page = await as('quispe');
	await openNote(page, 'ML-DN-002');
	const rows = page.locator('[data-item]');
	const before = await itemCount(page);

	await row(page, 'ml2-a1').focus();
	await page.keyboard.press('Alt+Enter');
	await page.getByRole('toolbar', { name: 'Add an item' }).first().getByText('Calculation').click();
	const opened = page.locator('[data-open]');
	await opened.getByLabel('Symbol', { exact: true }).fill('m_1');
	await opened.getByLabel('Expression', { exact: true }).fill('A_1 * 1 km * ρ');
	await opened.getByLabel('Show in', { exact: true }).fill('kg');
	await opened.getByLabel('Expression', { exact: true }).press('Enter');
	const added = page.locator('[data-item]', { hasText: '24.18' });
	// 15.4975 mm² × 1 km × 1 560 kg/m³ = 24.18 kg
	await expect(added.locator('.num')).toHaveText('3.10');
	await expect(rows).toHaveCount(before + 1);

	await added.focus();
	await page.keyboard.press('Alt+ArrowUp');
	await expect(added.locator('.num')).toHaveText('3.9');
	await added.focus();
	await added.getByRole('button', { name: 'Duplicate' }).click();
	await expect(rows).toHaveCount(before + 2);
	// Two items define m_1 now, and both say so.
	await expect(page.locator('[data-item]', { hasText: 'm_1' })).toHaveCount(2);

	await page.keyboard.press('Control+z');
	await expect(rows).toHaveCount(before + 1);
	await added.focus();
	await page.keyboard.press('Delete');
	await expect(rows).toHaveCount(before);
	await page.keyboard.press('Control+z');
	await expect(rows).toHaveCount(before + 1);
	await expect(added).toHaveCount(1);
});

test('an item is copied from one note of a programme into another', async ({ as }) => {
	const page = await as('quispe');
	await openNote(page, 'CL-DN-004');
	await row(page, 'cl4-fs').focus();
	await row(page, 'cl4-fs').getByRole('button', { name: 'Copy' }).click();
	await openNote(page, 'CL-DN-005');
	const rows = page.locator('[data-item]');
	const before = await itemCount(page);
	await row(page, 'cl5-n').focus();
	await page.keyboard.press('Alt+Enter');
	await page.getByRole('button', { name: 'Paste what was copied' }).first().click();
	await expect(rows).toHaveCount(before + 1);
	await expect(page.locator('[data-item]', { hasText: '2.8' })).toContainText('Factor of safety');
});

test('every fault stands in words at its item, and what depends on it waits', async ({ as }) => {
	const page = await as('lindqvist');
	await openNote(page, 'CL-DN-002');
	const unit = await field(page, 'cl2-b', 'Expression');
	await unit.fill('x_m - ro');
	await expect(row(page, 'cl2-b')).toContainText('ro');
	await unit.fill('x_m - k_B s + 2 t');
	// Both dimensions are named.
	await expect(row(page, 'cl2-b')).toContainText('mass');
	await expect(row(page, 'cl2-b')).toContainText('pressure');
	await unit.fill('x_m - k_B s + 0 σ_spec ρ');
	await expect(row(page, 'cl2-b')).toContainText('σ_B');
	await unit.fill('x_m / (n - 30)');
	await unit.press('Enter');
	await expect(row(page, 'cl2-b')).toContainText(/zero/i);
	await expect(row(page, 'cl2-spec')).toContainText('waits for');
	await expect(row(page, 'cl2-c-b')).toContainText('waits');
	await expect(page.locator('body')).not.toContainText(/NaN|Infinity/);

	const again = await field(page, 'cl2-b', 'Expression');
	await again.fill('x_m - k_B s');
	await again.press('Enter');
	// 120.9 − 1.777 × 6.1 = 110.06 GPa
	await expect(value(page, 'cl2-b')).toHaveText('110.1');
});
