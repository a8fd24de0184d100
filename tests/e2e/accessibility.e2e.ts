import AxeBuilder from '@axe-core/playwright';
import { expect, test } from './harness';
import { field, openNote } from './note-page';

const PAGES = [
	'/',
	'/programmes',
	'/programmes/CL',
	'/programmes/CL/people',
	'/programmes/CL/gates',
	'/programmes/CL/baselines',
	'/programmes/CL/parameters',
	'/programmes/CL/notes/CL-DN-002/freeze',
	'/programmes/CL/notes/CL-DN-002/compare?from=A&to=now',
	'/methods',
	'/methods/as-built',
	'/account'
];

for (const colorScheme of ['light', 'dark'] as const) {
	test(`no page offends WCAG 2.2 AA as far as a machine can tell, ${colorScheme}`, async ({
		as
	}) => {
		test.setTimeout(120_000);
		const page = await as('solvang', { colorScheme });
		const offences = async () => {
			const { violations } = await new AxeBuilder({ page })
				.withTags(['wcag2a', 'wcag2aa', 'wcag21aa', 'wcag22aa'])
				.analyze();
			return violations.map(({ id, nodes }) => `${id}: ${nodes[0]!.html.slice(0, 160)}`);
		};
		for (const path of PAGES) {
			await page.goto(path);
			await expect(page.getByRole('main')).toBeVisible();
			expect(await offences(), path).toEqual([]);
		}
		await page.goto('/programmes/CL/baselines');
		await page.getByRole('main').locator('a[href*="/baselines/"]').first().click();
		await page.waitForURL(/baselines\/.+/);
		expect(await offences(), 'a baseline').toEqual([]);
		await openNote(page, 'CL-DN-002');
		expect(await offences(), 'a note').toEqual([]);
		await field(page, 'cl2-b', 'Expression');
		expect(await offences(), 'a row open for editing').toEqual([]);
	});
}
