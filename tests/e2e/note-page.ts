/** What journeys do on a note, said once. */
import { expect, type Locator, type Page } from '@playwright/test';

export async function openNote(page: Page, number: string): Promise<void> {
	await page.goto(`/programmes/${number.split('-')[0]}/notes/${number}`);
	await expect(saved(page)).toContainText('Saved');
}

/** The row of an item by its id in the demo. */
export const row = (page: Page, id: string): Locator => page.locator(`[id="${id}"]`);

/** A figure of a row, as text. */
export const value = (page: Page, id: string): Locator => row(page, id).locator('.val');

/** How many items the note has, as told below the last of them: rows beyond the first screen come a moment later. */
export async function itemCount(page: Page): Promise<number> {
	const end = page.getByText(/^End of /);
	await expect(end).toBeVisible();
	return Number(/(\d+) items?\.?$/.exec((await end.innerText()).trim())![1]);
}

export const saved = (page: Page): Locator => page.getByRole('status').first();

/** Opens a row for editing and answers with its field. */
export async function field(page: Page, id: string, label: string): Promise<Locator> {
	const here = row(page, id);
	const opened = here.locator('[data-open]');
	if (!(await opened.isVisible())) {
		await here.focus();
		await page.keyboard.press('Enter');
	}
	await expect(opened).toBeVisible();
	return opened.getByLabel(label, { exact: true });
}

/** Waits until the page's scripts are kept for working without a connection. */
export async function readyForOffline(page: Page): Promise<void> {
	await page.waitForFunction(() => navigator.serviceWorker.controller?.state === 'activated');
}
