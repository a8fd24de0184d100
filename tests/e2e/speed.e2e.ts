/** What a large note may cost: script, opening, a keystroke. Figures are printed; limits are held. */
import { spawnSync } from 'node:child_process';
import { gzipSync } from 'node:zlib';
import type { Page } from '@playwright/test';
import { address } from '../../server/seed/people';
import { FIRST_GIVEN, LAST_CALCULATION } from '../bench/large-note';
import { expect, test, type Site } from './harness';
import { field, openNote, saved, value } from './note-page';

// A trace takes pictures of the page while it is measured.
test.use({ trace: 'off' });

const kilobytes = (bytes: number) => `${(bytes / 1000).toFixed(1)} kB`;
const percentile = (values: number[], part: number) =>
	[...values].sort((a, b) => a - b)[Math.min(values.length - 1, Math.floor(values.length * part))]!;
const figures = (times: number[]) =>
	`median ${percentile(times, 0.5).toFixed(1)} ms, p95 ${percentile(times, 0.95).toFixed(1)} ms`;

/** Measures anew, at most three times: what else the machine does can only add to a time. */
async function within(limit: number, part: number, what: string, measure: () => Promise<number[]>) {
	let least = Infinity;
	for (let round = 0; round < 3 && least > limit; round++) {
		const times = await measure();
		console.log(`${what}: ${figures(times)}, n = ${times.length}`);
		least = Math.min(least, percentile(times, part));
	}
	expect(least, what).toBeLessThanOrEqual(limit);
}

function writeLargeNote(site: Site): string {
	const command = ['--import', 'tsx', 'tests/bench/write-large-note.ts', 'CL', address('nwosu')];
	const { stdout, stderr, status } = spawnSync(process.execPath, command, {
		encoding: 'utf8',
		env: { ...process.env, ...site.environment }
	});
	if (status !== 0) throw new Error(stderr);
	return stdout.trim();
}

/** Gzipped size of every script that a page loads until nothing more comes. */
async function scriptOf(page: Page, path: string): Promise<number> {
	const sizes = new Map<string, Promise<number>>();
	page.on('response', (response) => {
		const { pathname } = new URL(response.url());
		if (pathname.endsWith('.js'))
			sizes.set(
				pathname,
				response.body().then((body) => gzipSync(body).length)
			);
	});
	await page.goto(path, { waitUntil: 'networkidle' });
	const all = await Promise.all(sizes.values());
	return all.reduce((sum, size) => sum + size, 0);
}

test('a note page loads at most 300 kB of script, gzipped; any other at most 120 kB', async ({
	as
}) => {
	const first = await as('laine');
	await first.goto('/programmes/CL/baselines');
	const baseline = await first
		.getByRole('main')
		.locator('a[href*="/baselines/"]')
		.first()
		.getAttribute('href');
	const paths = [
		'/',
		'/programmes',
		'/programmes/CL',
		'/programmes/CL/people',
		'/programmes/CL/gates',
		'/programmes/CL/baselines',
		'/programmes/CL/parameters',
		baseline!,
		'/programmes/CL/notes/CL-DN-004/compare?from=A&to=now',
		'/methods',
		'/methods/as-built',
		'/account'
	];
	for (const path of paths) {
		const size = await scriptOf(await as('laine'), path);
		console.log(`script of ${path}: ${kilobytes(size)}`);
		expect(size, path).toBeLessThan(120_000);
	}
	const note = await scriptOf(await as('laine'), '/programmes/CL/notes/CL-DN-004');
	console.log(`script of a note: ${kilobytes(note)}`);
	expect(note).toBeLessThan(300_000);
});

test('a note of 300 items opens within 1.5 s on a processor slowed four times', async ({
	as,
	site
}) => {
	test.setTimeout(180_000);
	const number = writeLargeNote(site);
	await as('nwosu');
	await within(1500, 0.5, 'a note of 300 items opens on a first visit, slowed 4 ×', async () => {
		const times: number[] = [];
		// Each in a browser that has nothing of the site in its cache.
		for (let n = 0; n < 7; n++) times.push(await opening(await as('nwosu'), number));
		return times;
	});
	const again = (await as('nwosu')).context();
	await opening(await again.newPage(), number);
	await within(1500, 0.5, 'the same on a later visit', async () => {
		const times: number[] = [];
		for (let n = 0; n < 5; n++) times.push(await opening(await again.newPage(), number));
		return times;
	});
});

/** From the start of the navigation to the first figures, on a page whose rows open for editing. */
async function opening(page: Page, number: string): Promise<number> {
	await page.addInitScript(() => {
		const look = () => {
			const figure = document.getElementById('calc-1')?.querySelector('.val')?.textContent;
			if (figure) (window as { interactiveAt?: number }).interactiveAt = performance.now();
			else requestAnimationFrame(look);
		};
		requestAnimationFrame(look);
	});
	const session = await page.context().newCDPSession(page);
	await session.send('Emulation.setCPUThrottlingRate', { rate: 4 });
	await page.goto(`/programmes/CL/notes/${number}`);
	const shown = await page.waitForFunction(
		() => (window as { interactiveAt?: number }).interactiveAt
	);
	const at = (await shown.jsonValue())!;
	await expect(await field(page, FIRST_GIVEN, 'Value')).toBeEditable();
	await page.close();
	return at;
}

const KEYSTROKES = 40;

/** Keys alone and nothing asked of the page meanwhile: a question takes its time from the same thread. */
async function typeInto(page: Page) {
	for (let n = 0; n < KEYSTROKES; n++) {
		await page.keyboard.press(n % 2 === 0 ? '1' : 'Backspace');
		await page.waitForTimeout(120);
	}
}

/** Times from a keystroke on this page to the frame after a figure of the page has changed. */
async function keystrokeTimes(page: Page, id: string, type: () => Promise<void>) {
	await page.evaluate((figureId) => {
		const times: number[] = [];
		let pressed = 0;
		addEventListener('keydown', () => (pressed = performance.now()), { capture: true });
		new MutationObserver(() => {
			if (pressed === 0) return;
			const since = pressed;
			pressed = 0;
			requestAnimationFrame(() => times.push(performance.now() - since));
		}).observe(document.getElementById(figureId)!, {
			subtree: true,
			childList: true,
			characterData: true
		});
		(window as { keystrokes?: number[] }).keystrokes = times;
	}, id);
	await type();
	return page.evaluate(() => (window as { keystrokes?: number[] }).keystrokes!);
}

test('a keystroke in the first given of 300 items shows the last result within 50 ms', async ({
	as,
	site
}) => {
	const number = writeLargeNote(site);
	const page = await as('nwosu');
	await openNote(page, number);
	await expect(value(page, LAST_CALCULATION)).not.toBeEmpty();
	const given = await field(page, FIRST_GIVEN, 'Value');
	await given.press('End');
	await within(50, 0.95, 'keystroke to the last of 200 results', async () => {
		const times = await keystrokeTimes(page, LAST_CALCULATION, () => typeInto(page));
		expect(times).toHaveLength(KEYSTROKES);
		return times;
	});
});

test('an edit on the demo note reaches its own results and the other screen at once', async ({
	as
}) => {
	const one = await as('nwosu');
	const other = await as('quispe');
	await openNote(one, 'CL-DN-004');
	await openNote(other, 'CL-DN-004');
	await expect(value(other, 'cl4-tot')).not.toBeEmpty();

	await other.evaluate(() => {
		const seen: number[] = [];
		new MutationObserver(() => seen.push(performance.timeOrigin + performance.now())).observe(
			document.getElementById('cl4-tot')!.querySelector('.val')!,
			{ subtree: true, childList: true, characterData: true }
		);
		(window as { seen?: number[] }).seen = seen;
	});
	await one.evaluate(() => {
		const pressed: number[] = [];
		addEventListener('keydown', () => pressed.push(performance.timeOrigin + performance.now()), {
			capture: true
		});
		(window as { pressed?: number[] }).pressed = pressed;
	});
	const fs = await field(one, 'cl4-fs', 'Value');
	await fs.press('End');
	await one.evaluate(() => ((window as { pressed?: number[] }).pressed!.length = 0));
	const own = await keystrokeTimes(one, 'cl4-tot', async () => {
		for (let n = 0; n < 20; n++) {
			const before = await value(other, 'cl4-tot').textContent();
			await fs.press(n % 2 === 0 ? '1' : 'Backspace');
			await expect(value(other, 'cl4-tot')).not.toHaveText(before!);
		}
	});
	const pressed = await one.evaluate(() => (window as { pressed?: number[] }).pressed!);
	const seen = await other.evaluate(() => (window as { seen?: number[] }).seen!);
	const across = pressed.flatMap((at, index) => {
		const next = pressed[index + 1] ?? Infinity;
		const first = seen.find((time) => time >= at && time < next);
		return first === undefined ? [] : [first - at];
	});
	console.log(`edit to result on the demo note: ${figures(own)}`);
	console.log(`edit to the other screen on the demo note: ${figures(across)}`);
	expect(across.length).toBeGreaterThan(15);
	expect(percentile(own, 0.5)).toBeLessThan(100);
	expect(percentile(across, 0.5)).toBeLessThan(250);
	await expect(saved(one)).toContainText('Saved');
});
