import { expect, test } from './harness';
import { field, openNote, row, value } from './note-page';

test('a reviewer’s pin arrives live, keeps its value while the number moves, and is answered and settled', async ({
	as,
	site
}) => {
	const quispe = await as('quispe');
	const haddad = await as('haddad');
	await openNote(quispe, 'CL-DN-005');
	await openNote(haddad, 'CL-DN-005');
	// (1 + 0.30) × 14 t × 9.7644 m/s² = 177.7 kN
	await expect(value(haddad, 'cl5-t')).toHaveText('177.7');

	const theirs = row(haddad, 'cl5-t');
	await theirs.focus();
	await theirs.getByRole('button', { name: 'Pin a remark' }).click();
	await theirs.getByLabel('Remark on 3.1').fill('Is the reserve on top of the climber’s weight?');
	await theirs.getByRole('button', { name: 'Pin the remark' }).click();
	await expect(theirs).toContainText('Is the reserve on top');

	// It reaches the engineer without a reload.
	const mine = row(quispe, 'cl5-t');
	await mine.focus();
	await mine.getByRole('button', { name: 'Remarks, 1' }).click();
	await expect(mine).toContainText('Is the reserve on top of the climber’s weight?');

	// The author of the item gets mail, with the value at the time.
	await expect
		.poll(
			() =>
				site
					.mails('quispe@halden.example')
					.map(({ text }) => text)
					.join('\n'),
			{
				timeout: 15_000
			}
		)
		.toMatch(/Is the reserve on top[\s\S]*|177\.7/);

	const reserve = await field(quispe, 'cl5-reserve', 'Value');
	await reserve.fill('0.40');
	await reserve.press('Enter');
	// (1 + 0.40) × 14 t × 9.7644 m/s² = 191.4 kN
	await expect(theirs).toContainText('177.7');
	await expect(theirs).toContainText('when pinned');
	await expect(theirs).toContainText('191.4');

	await mine.focus();
	const thread = quispe.getByRole('region', { name: 'Remarks on 3.1' });
	if (!(await thread.isVisible())) await mine.getByRole('button', { name: 'Remarks, 1' }).click();
	await thread.getByRole('button', { name: 'Answer' }).click();
	await thread.getByLabel('Answer', { exact: true }).fill('Yes, by CL-ST-01, 5.4.');
	await thread.getByRole('button', { name: 'Answer' }).click();
	await expect(theirs).toContainText('Yes, by CL-ST-01, 5.4.');
	await theirs.getByRole('button', { name: 'Mark as settled' }).click();
	await expect(thread).toContainText('Settled by L. Haddad');
});

test('a pinned item that is removed keeps its pins, and is put back', async ({ as }) => {
	const solvang = await as('solvang');
	await openNote(solvang, 'CL-DN-004');
	await expect(value(solvang, 'cl4-rho')).toBeVisible();
	await row(solvang, 'cl4-rho').focus();
	await solvang.keyboard.press('Delete');
	const removed = solvang.getByRole('listitem').filter({ hasText: 'remark stays' });
	await expect(removed).toContainText('Density');
	await removed.getByRole('button', { name: 'Read' }).click();
	await expect(removed).toContainText('Is this with the binder');
	await removed.getByRole('button', { name: 'Put back' }).click();
	await expect(value(solvang, 'cl4-rho')).toBeVisible();
});

test('home lists remarks that wait for an answer', async ({ as }) => {
	const lindqvist = await as('nwosu');
	await lindqvist.goto('/');
	await expect(lindqvist.getByRole('heading', { name: /Waits for you/ })).toBeVisible();
	await expect(lindqvist.getByRole('main')).toContainText('CL-DN-004');
});
