import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { expect, test } from './harness';
import { field, openNote, row, saved, value } from './note-page';

test('two people write one text at once, with each other’s carets, and others read it live', async ({
	as
}) => {
	const solvang = await as('solvang');
	const quispe = await as('quispe');
	const laine = await as('laine');
	for (const page of [solvang, quispe, laine]) await openNote(page, 'ML-DN-001');
	const texts = [solvang, quispe].map((page) => row(page, 'ml1-why'));
	for (const [index, page] of [solvang, quispe].entries()) {
		await texts[index]!.focus();
		await page.keyboard.press('Enter');
		await expect(texts[index]!.locator('[contenteditable="true"]')).toBeVisible();
	}
	await texts[0]!.locator('[contenteditable="true"] p').first().click();
	await solvang.keyboard.press('Home');
	await solvang.keyboard.type('First form. ');
	await texts[1]!.locator('[contenteditable="true"] p').first().click();
	await quispe.keyboard.press('Control+End');
	await quispe.keyboard.type(' By two hands.');
	for (const page of [solvang, quispe, laine]) {
		await expect(row(page, 'ml1-why')).toContainText('First form.');
		await expect(row(page, 'ml1-why')).toContainText('By two hands.');
	}
	await expect(texts[0]!).toContainText('M. Quispe');

	// Bold, and the live value of a quantity, from the bar of words.
	await quispe.keyboard.press('Control+b');
	await quispe.keyboard.type(' Bold.');
	await expect(row(laine, 'ml1-why').locator('strong, b')).toContainText(['Bold.']);
	await solvang.keyboard.press('Escape');
	await expect(row(laine, 'ml1-why')).toContainText('By two hands.');
});

test('a picture put in as evidence is shown in place with the digest of its bytes, a program is not taken', async ({
	as
}) => {
	const nwosu = await as('nwosu');
	await openNote(nwosu, 'CL-DN-004');
	const evidence = row(nwosu, 'cl4-joints');
	await evidence.focus();
	const picture = 'server/seed/files/lap-joints-batch-7.png';
	const bytes = readFileSync(picture);
	await evidence
		.locator('input[type="file"]')
		.setInputFiles({ name: 'break-faces.png', mimeType: 'image/png', buffer: bytes });
	const digest = createHash('sha256').update(bytes).digest('hex');
	await expect(evidence).toContainText('break-faces.png');
	await expect(evidence.locator(`[title="SHA-256 ${digest}"]`)).toHaveCount(2);
	const shown = evidence.locator('img[alt^="break-faces.png"]');
	await shown.scrollIntoViewIfNeeded();
	await expect
		.poll(() => shown.evaluate((image) => (image as HTMLImageElement).naturalWidth))
		.toBeGreaterThan(100);

	await evidence.locator('input[type="file"]').setInputFiles({
		name: 'harmless.png',
		mimeType: 'image/png',
		buffer: Buffer.concat([Buffer.from([0x7f, 0x45, 0x4c, 0x46, 2, 1, 1, 0]), Buffer.alloc(64)])
	});
	await expect(evidence.getByRole('alert')).toContainText('harmless.png was not taken');

	const reader = await as('haddad');
	await openNote(reader, 'CL-DN-004');
	await expect(row(reader, 'cl4-joints')).toContainText('break-faces.png');
});

test('a line model shows the figures that an independent integration gives, and follows its inputs', async ({
	as
}) => {
	const quispe = await as('quispe');
	await openNote(quispe, 'CL-DN-004');
	const model = row(quispe, 'cl4-line');
	// Another journey may have moved the top.
	const given = await field(quispe, 'cl4-top', 'Value');
	await given.fill('88000');
	await given.press('Enter');
	// SciPy's quad over the same field (WGS 84, J2 left out) at 60.469 GPa, 1520 kg/m³, 14 t, 88 000 km.
	for (const figure of ['3.378', '882.9', '715.4', '461.7', '7.636']) {
		await expect(model).toContainText(figure);
	}
	await expect(value(quispe, 'cl4-tot')).toHaveText(/1.598/);

	await model.getByText('Open across the sheet').click();
	await expect(
		quispe.getByText('All panels share the height axis', { exact: false })
	).toBeVisible();
	await quispe.getByRole('button', { name: 'Table', exact: true }).click();
	const table = quispe.getByRole('table').first();
	// By the same integration: section and tension at 20 000 km and at the top.
	for (const figure of ['7.120', '430.6', '5.408', '327.0'])
		await expect(table).toContainText(figure);
	await quispe.getByText('Close the charts').click();

	// A top below synchronous height is refused in words that say what to change.
	const top = await field(quispe, 'cl4-top', 'Value');
	await top.fill('30000');
	await top.press('Enter');
	await expect(model).toContainText(/synchronous/);
	await expect(model).toContainText(/35.786/);
	await expect(row(quispe, 'cl4-tot')).toContainText('waits for');
	const again = await field(quispe, 'cl4-top', 'Value');
	await again.fill('88000');
	await again.press('Enter');
	await expect(value(quispe, 'cl4-tot')).toHaveText(/1.598/);
	await expect(saved(quispe)).toContainText('Saved');
});

test('a sized line is looked at further by a method that opens with it filled in', async ({
	as
}) => {
	const quispe = await as('quispe');
	await openNote(quispe, 'CL-DN-004');
	const model = row(quispe, 'cl4-line');
	await model.getByRole('link', { name: 'as built' }).click();
	await expect(quispe.getByRole('heading', { name: 'As-built analysis' })).toBeVisible();
	// 14 t at the anchor, GM/R² − ω²R = 9.7641 m/s² by hand: 136.7 kN.
	await expect(quispe.getByText('tension at the anchor').first()).toBeVisible();
	await expect(quispe.getByText(/136[.,]7/).first()).toBeVisible();
});

test('a list goes value by value through a formula, and whoever reads the note opens its values', async ({
	as
}) => {
	const abara = await as('abara');
	const laine = await as('laine');
	for (const page of [abara, laine]) await openNote(page, 'CL-DN-003');
	const energy = row(laine, 'cl3-energy');
	const expression = await field(abara, 'cl3-energy', 'Expression');
	const before = await expression.inputValue();
	await expression.fill('[14 t, 15 t, 3 s] * ΔU');
	await expect(row(abara, 'cl3-energy')).toContainText('cannot be set beside it: it is a time');
	await expression.fill('[14 t, 15 t, 16 t] * ΔU');
	// 14, 15 and 16 t × 48.4227 MJ/kg in MWh.
	await expect(row(abara, 'cl3-energy').getByRole('region', { name: 'Values' })).toContainText(
		'E_s[2]201.8'
	);
	await expect(energy.locator('summary')).toHaveText(/^3 values, 188.3 to 215.2.MWh$/);
	await energy.locator('summary').click();
	await expect(energy.getByRole('row')).toHaveText([/188.3/, /201.8/, /215.2/]);
	await expression.fill('interpolate(3 t, [2 t, 4 t], [1 MWh, 2 MWh])');
	await expect(value(laine, 'cl3-energy')).toHaveText('1.500');
	await expression.fill(before);
	await expression.press('Enter');
	await expect(value(laine, 'cl3-energy')).toHaveText('219.0');
});

test('a line stands on a body of one’s own, whose figures are checked where they are typed', async ({
	as
}) => {
	const quispe = await as('quispe');
	const haddad = await as('haddad');
	for (const page of [quispe, haddad]) await openNote(page, 'CL-DN-004');
	const model = row(quispe, 'cl4-line');
	const density = await field(quispe, 'cl4-line', 'Density');
	const written = await density.inputValue();
	await density.fill('1300 kg/m^3');
	await model.getByLabel('Allowable stress of the material').fill('40 GPa');
	await model.getByLabel('Factor of safety').fill('2');
	await model.getByLabel('Lift', { exact: true }).fill('5 t');
	await model.getByLabel('Height of the top').fill('60 000 km');
	await model.getByLabel('Body').selectOption('own');
	await model.getByLabel('Gravitational parameter').fill('4.2828375e13 m^3/s^2');
	await model.getByLabel('Equatorial radius').fill('3396.19 s');
	await model.getByLabel('Period of rotation').fill('88642.66 s');
	await expect(model).toContainText(
		'The equatorial radius must be a length, L; this is a time, T.'
	);
	await model.getByLabel('Equatorial radius').fill('3396.19 km');
	// Areostationary orbit: 20 428 km from the centre, common practice.
	const seen = row(haddad, 'cl4-line');
	await expect(seen).toContainText(/20.428/);
	await expect(seen).toContainText('a body of one’s own');

	await model.getByLabel('Body').selectOption('moonFar');
	await model.getByLabel('Gravitational parameter of the moon').fill('');
	await model.getByLabel('Radius of the moon').fill('');
	await model.getByLabel('Height of the top').fill('100 000 km');
	// L2 of the Moon at 384 400 km: 64 515 km from its centre.
	await expect(seen).toContainText(/64.515/);
	await model.getByLabel('Radius of the moon').press('Escape');
	await expect(seen).toContainText('Earth');
	expect(await (await field(quispe, 'cl4-line', 'Density')).inputValue()).toBe(written);
});

test('a symbol is completed with Tab, and Esc leaves a row as it was', async ({ as }) => {
	const abara = await as('abara');
	await openNote(abara, 'CL-DN-003');
	const expression = await field(abara, 'cl3-energy', 'Expression');
	const before = await expression.inputValue();
	await expression.press('End');
	await expression.pressSequentially(' * v_m');
	await expect(row(abara, 'cl3-energy')).toContainText('Greatest speed on the tape');
	await expression.press('Tab');
	await expect(expression).toHaveValue(`${before} * v_max`);
	await expression.press('Escape');
	await expect(row(abara, 'cl3-energy').locator('[data-open]')).toHaveCount(0);
	// 14 t × 48.4227 MJ/kg / 0.86 = 218.97 MWh
	await expect(value(abara, 'cl3-energy')).toHaveText('219.0');
});
