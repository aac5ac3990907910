import type { BrowserContext, Page } from '@playwright/test';
import { expect, signIn, test } from '../support/browser';

test.use({
	serviceWorkers: 'allow',
	expectedComplaints: [/ERR_INTERNET_DISCONNECTED|Failed to fetch|ERR_FAILED|40[14] \(/]
});

const tray = (page: Page) => page.getByRole('list', { name: 'Photos on their way' });
const stored = (page: Page) => page.getByRole('link', { name: /P1 OFFLINE: / });

/** What the caches hold, by their addresses. */
const kept = (page: Page) =>
	page.evaluate(async () => {
		const found: string[] = [];
		for (const name of await caches.keys())
			for (const { url } of await (await caches.open(name)).keys())
				found.push(new URL(url).pathname);
		return found;
	});

/** Waits until pages come from the phone when they must. */
async function equipped(page: Page, path: string): Promise<void> {
	await page.waitForFunction(() => navigator.serviceWorker.controller !== null);
	await expect.poll(() => kept(page)).toContain(path);
}

async function offline(context: BrowserContext, off: boolean): Promise<void> {
	await context.setOffline(off);
}

test('a donor is photographed without a signal, the page left and opened again, all stored once', async ({
	page,
	context
}) => {
	await signIn(page, 'bench');
	await page.goto('/osiergate/donors/new');
	await page.getByLabel('Model').fill('P1 OFFLINE');
	await page.getByRole('button', { name: 'Take in' }).click();
	await page.waitForURL(/\/donors\/D\d+/);
	const donor = new URL(page.url()).pathname;
	await equipped(page, '/osiergate/photos');
	await page.goto(donor);
	await equipped(page, donor);

	await offline(context, true);
	await page.getByLabel('Take a photo').setInputFiles('fixtures/photos/label.jpg');
	await page.getByLabel('Choose photos').setInputFiles('fixtures/photos/box.jpg');
	await expect(tray(page).getByText('No signal.')).toHaveCount(2);
	await page.reload();
	await expect(page.getByRole('heading', { level: 1 })).toContainText('P1 OFFLINE');
	await expect(tray(page).getByRole('listitem')).toHaveCount(2);

	await test.step('a page that was never seen gives way to one that photographs anything', async () => {
		await page.goto('/osiergate/donors/D1');
		await expect(page.getByRole('heading', { level: 1 })).toHaveText('Photos on this phone');
		await page.getByLabel('Tag or donor').fill(donor.split('/').at(-1)!);
		await page.getByLabel('Take a photo').setInputFiles('fixtures/photos/box.jpg');
		await expect(tray(page).getByRole('listitem')).toHaveCount(3);
	});

	await offline(context, false);
	await expect(tray(page).getByText('Sent', { exact: true })).toHaveCount(3);
	await page.goto(donor);
	await expect(stored(page)).toHaveCount(3);
	await expect(tray(page)).toBeHidden();
	await page.reload();
	await expect(stored(page)).toHaveCount(3);
});

test('what is kept is never a picture, and nothing of it stays for the next account', async ({
	page
}) => {
	await signIn(page, 'bench');
	await page.goto('/osiergate/donors');
	await equipped(page, '/osiergate/photos');
	await page.goto('/osiergate/donors');
	await equipped(page, '/osiergate/donors');
	expect((await kept(page)).filter((path) => path.startsWith('/api/'))).toEqual([]);
	const picture = await page.evaluate(() =>
		document.querySelector('img[src^="/api/"]')?.getAttribute('src')
	);
	expect(picture).toBeTruthy();

	await page.goto('/osiergate/people');
	await page.getByRole('button', { name: 'Sign out' }).click();
	await page.waitForURL((url) => url.pathname === '/');
	await expect
		.poll(async () => (await kept(page)).filter((path) => path.startsWith('/osiergate')))
		.toEqual([]);
	const asked = (path: string) => page.evaluate(async (at) => (await fetch(at)).status, path);
	expect(await asked(picture!)).toBe(401);
	await signIn(page, 'neighbour');
	expect(await asked(picture!)).toBe(404);
	await page.goto('/thrennick/donors');
	await equipped(page, '/thrennick/photos');
	expect((await kept(page)).filter((path) => path.startsWith('/osiergate'))).toEqual([]);
});
