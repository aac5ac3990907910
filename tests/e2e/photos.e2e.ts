import type { Page } from '@playwright/test';
import { expect, signIn, test } from '../support/browser';

/** A donor of this test's own. Returns its page. */
async function takenIn(page: Page, model: string): Promise<string> {
	await page.goto('/osiergate/donors/new');
	await page.getByLabel('Model').fill(model);
	await page.getByRole('button', { name: 'Take in' }).click();
	await page.waitForURL(/\/donors\/D\d+/);
	return new URL(page.url()).pathname;
}

const UPLOADS = '**/api/osiergate/donors/*/photos';
const label = 'fixtures/photos/label.jpg';
const box = 'fixtures/photos/box.jpg';
const tray = (page: Page) => page.getByRole('list', { name: 'Photos on their way' });
const onPhone = (page: Page, count: string) =>
	page.getByRole('link', { name: new RegExp(`${count} still on this phone`) });
const stored = (page: Page) => page.getByRole('link', { name: /P1 .*: / });
const gallery = (page: Page) => page.getByLabel('Choose photos');

test.describe('without a signal', () => {
	test.use({ expectedComplaints: [/ERR_FAILED|ERR_INTERNET_DISCONNECTED|Failed to fetch/] });

	test('photos wait on the phone, outlive the page and are stored once each', async ({ page }) => {
		await signIn(page, 'bench');
		const donor = await takenIn(page, 'P1 WAITS');
		await page.route(UPLOADS, (route) => route.abort());
		await expect(gallery(page)).toBeAttached();
		await gallery(page).setInputFiles([label, box]);
		await page.getByLabel('Take a photo').setInputFiles(label);
		await expect(tray(page).getByText('No signal.')).toHaveCount(3);
		await expect(onPhone(page, '3 photos are')).toBeVisible();

		await page.reload();
		await expect(tray(page).getByRole('listitem')).toHaveCount(3);
		await expect(onPhone(page, '3 photos are')).toBeVisible();
		await page.goto('/osiergate/parts');
		await expect(onPhone(page, '3 photos are')).toBeVisible();

		await page.unroute(UPLOADS);
		// Every answer of the first round is lost on its way back.
		let lost = 0;
		await page.route(UPLOADS, async (route) => {
			await route.fetch();
			lost += 1;
			await route.abort();
		});
		await page.goto(donor);
		await expect.poll(() => lost).toBeGreaterThanOrEqual(3);
		await page.unroute(UPLOADS);
		await page.getByRole('button', { name: 'Try to send now' }).click();
		await expect(tray(page)).toBeHidden();
		await expect(onPhone(page, 'photo')).toBeHidden();
		await expect(stored(page)).toHaveCount(3);
		await page.reload();
		await expect(stored(page)).toHaveCount(3);
	});

	test('somebody else on the phone sends nothing of it, and is told whose it is', async ({
		page
	}) => {
		await signIn(page, 'bench');
		await takenIn(page, 'P1 THEIRS');
		await page.route(UPLOADS, (route) => route.abort());
		await expect(gallery(page)).toBeAttached();
		await gallery(page).setInputFiles(box);
		await expect(tray(page).getByText('No signal.')).toHaveCount(1);

		await page.goto('/osiergate/people');
		await expect(onPhone(page, '1 photo is')).toBeVisible();
		await page.getByRole('button', { name: 'Sign out' }).click();
		await expect(page.getByText('Before you sign out')).toBeVisible();
		await page.getByRole('button', { name: 'Sign out and keep them here' }).click();
		await page.waitForURL((url) => url.pathname === '/');
		await page.unroute(UPLOADS);

		let sent = 0;
		await page.route('**/api/**/photos', (route) => {
			sent += 1;
			return route.continue();
		});
		await signIn(page, 'neighbour');
		await page.goto('/thrennick/photos');
		await expect(page.getByText('1 photo of Corwin Paske.')).toBeVisible();
		await expect(onPhone(page, 'photo')).toBeHidden();
		expect(sent).toBe(0);
		await page.getByText('Throw them away').click();
		await page.getByRole('button', { name: 'Throw 1 photo away for good' }).click();
		await expect(page.getByText('Taken by somebody else')).toBeHidden();
	});
});

test.describe('a photo that is refused', () => {
	test.use({ expectedComplaints: [/400 \(Bad Request\)/] });

	test('stops no other, and is sent again or thrown away by hand', async ({ page }) => {
		await signIn(page, 'bench');
		await takenIn(page, 'P1 MIXED');
		await expect(gallery(page)).toBeAttached();
		const page_ = {
			name: 'page.jpg',
			mimeType: 'image/jpeg',
			buffer: Buffer.from('<html></html>')
		};
		await gallery(page).setInputFiles([page_]);
		await gallery(page).setInputFiles([label, box]);
		await expect(stored(page)).toHaveCount(2);
		await expect(tray(page).getByRole('alert')).toHaveText(/This is not a photo that can be kept/);
		await expect(onPhone(page, '1 photo is')).toContainText('1 not sent');
		await tray(page).getByRole('button', { name: 'Throw away' }).click();
		await tray(page).getByRole('button', { name: 'Keep it after all' }).click();
		await tray(page).getByRole('button', { name: 'Send again' }).click();
		await expect(tray(page).getByRole('alert')).toBeVisible();
		await tray(page).getByRole('button', { name: 'Throw away' }).click();
		await expect(onPhone(page, 'photo')).toBeHidden();
	});
});

test('a photo goes out small and upright, a HEIC as it is, and anything with a tag can be photographed', async ({
	page
}) => {
	await page.addInitScript(() => {
		const send = XMLHttpRequest.prototype.send;
		XMLHttpRequest.prototype.send = function (body) {
			const file = body instanceof FormData ? body.get('file') : null;
			if (file instanceof File)
				sessionStorage.sent = `${sessionStorage.sent ?? ''} ${file.type}:${file.size}`;
			send.call(this, body);
		};
	});
	await signIn(page, 'bench');
	const donor = await takenIn(page, 'P1 SMALL');
	await expect(gallery(page)).toBeAttached();
	await gallery(page).setInputFiles([label, 'fixtures/photos/label.heic']);
	await expect(stored(page)).toHaveCount(2);
	const sent: string[] = (await page.evaluate(() => sessionStorage.sent)).trim().split(' ');
	expect(sent.map((one) => one.split(':')[0]).sort()).toEqual([
		expect.stringMatching(/hei[cf]$/),
		'image/webp'
	]);
	for (const one of sent) expect(Number(one.split(':')[1])).toBeLessThan(350 * 1024);

	await page.goto('/osiergate/photos');
	await page.getByLabel('Tag or donor').fill(donor.split('/').at(-1)!.toLowerCase());
	await page.getByLabel('Take a photo').setInputFiles(box);
	await expect(tray(page).getByText('Sent', { exact: true })).toBeVisible();
	await page.goto(donor);
	await expect(stored(page)).toHaveCount(3);
	for (const image of await page.locator('.strip img').all()) {
		await image.scrollIntoViewIfNeeded();
		await expect
			.poll(() => image.evaluate((one: HTMLImageElement) => one.naturalWidth > one.naturalHeight))
			.toBe(true);
	}
});

test('photos chosen in a form are several in a row, and outlive its page', async ({ page }) => {
	await signIn(page, 'bench');
	await page.goto('/osiergate/donors/new');
	const chosen = page.getByRole('list', { name: 'Photos chosen' });
	const camera = page.getByLabel('Photo of the plate');
	await expect(camera).toHaveAttribute('capture', 'environment');
	await page.waitForLoadState('networkidle');
	await camera.setInputFiles(label);
	await expect(chosen.getByRole('listitem')).toHaveCount(1);
	await camera.setInputFiles(box);
	await expect(chosen.getByRole('listitem')).toHaveCount(2);
	await expect
		.poll(() => page.evaluate(async () => (await indexedDB.databases()).map(({ name }) => name)))
		.toContain('endplay-photos');

	await expect(async () => {
		await page.reload();
		await expect(page.getByText('2 photos were taken here and not sent.')).toBeVisible();
	}).toPass();
	await page.getByRole('button', { name: 'Use them' }).click();
	await expect(chosen.getByRole('listitem')).toHaveCount(2);
	await page.getByRole('button', { name: 'Leave out box.jpg' }).click();
	await page.getByLabel('Model').fill('P1 FORM');
	await page.getByRole('button', { name: 'Take in' }).click();
	await expect(page.getByRole('heading', { level: 1 })).toContainText('P1 FORM');
	await expect(stored(page)).toHaveCount(1);

	await page.goto('/osiergate/donors/new');
	await page.waitForLoadState('networkidle');
	await expect(page.getByText('taken here and not sent')).toBeHidden();
});

test('a photo that was taken away comes back, from a donor and from a part', async ({ page }) => {
	await signIn(page, 'bench');
	await takenIn(page, 'P1 AWAY');
	await expect(gallery(page)).toBeAttached();
	await gallery(page).setInputFiles(box);
	await expect(stored(page)).toHaveCount(1);
	await page.getByText('Take a photo away').click();
	await page.getByRole('button', { name: /^Take away the photo/ }).click();
	await expect(stored(page)).toHaveCount(0);
	await expect(page.getByText(/front, .*by Corwin Paske/)).toBeVisible();
	await page.getByRole('button', { name: /^Put back the photo/ }).click();
	await expect(stored(page)).toHaveCount(1);
	await expect(page.getByText('photo taken away')).toBeHidden();
});

test('at a desk photos are dropped, as they are', async ({ browser }) => {
	const context = await browser.newContext({
		viewport: { width: 1280, height: 900 },
		isMobile: false,
		hasTouch: false
	});
	const page = await context.newPage();
	await signIn(page, 'owner');
	await takenIn(page, 'P1 DROP');
	await expect(page.getByText('Or drop up to 50 photos here')).toBeVisible();
	const files = await page.evaluateHandle(async () => {
		const canvas = new OffscreenCanvas(2600, 1950);
		canvas.getContext('2d')?.fillRect(0, 0, 2600, 1950);
		const picture = await canvas.convertToBlob({ type: 'image/jpeg', quality: 1 });
		const all = new DataTransfer();
		for (const name of ['1.jpg', '2.jpg', '3.jpg'])
			all.items.add(new File([picture], name, { type: 'image/jpeg' }));
		return all;
	});
	await page.getByRole('group', { name: 'Place to drop photos' }).dispatchEvent('drop', {
		dataTransfer: files
	});
	await expect(stored(page)).toHaveCount(3);
	await context.close();
});
