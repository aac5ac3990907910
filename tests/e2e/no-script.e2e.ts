import { expect, signIn, test } from '../support/browser';
import { findShown, pagesOf } from '../support/screens';

test.use({ javaScriptEnabled: false, trace: 'off' });

test('without scripts every page is read', async ({ page }) => {
	await signIn(page, 'owner');
	for (const path of pagesOf(await findShown(page))) {
		const answer = await page.goto(path);
		expect(answer?.status(), path).toBe(200);
		await expect(page.locator('h1'), path).toHaveCount(1);
		await expect(page.locator('h1'), path).not.toBeEmpty();
	}
});

test('without scripts the plain forms do their work', async ({ page }) => {
	await signIn(page, 'owner');
	const shown = await findShown(page);

	await test.step('take in, with a photo', async () => {
		await page.goto('/osiergate/donors/new');
		await page.getByLabel('Photo of the plate').setInputFiles('fixtures/photos/label.jpg');
		await page.getByLabel('Model').fill('LOFT-16U');
		await page.getByRole('button', { name: 'Take in' }).click();
		await expect(page.getByRole('heading', { level: 1 })).toContainText('LOFT-16U');
		await expect(page.getByRole('status').first()).toContainText('Taken in as D');
	});

	await test.step('log a part', async () => {
		await page.goto(`/osiergate/donors/${shown.bench}/log`);
		await page.getByLabel('Kind of part, by any name').fill('carb');
		await page.getByRole('button', { name: 'Look up' }).click();
		await page
			.getByRole('link', { name: /^Carburetor, float bowl/ })
			.first()
			.click();
		await page.getByRole('radio', { name: 'good used' }).check();
		await page.getByRole('button', { name: /^Kept/ }).click();
		await expect(page.getByRole('status')).toContainText('Carburetor, float bowl');
		await page.getByRole('button', { name: 'Undo' }).click();
		await expect(page.getByRole('status')).toContainText(/Undone/i);
	});

	await test.step('move', async () => {
		await page.goto(`/osiergate/parts/${shown.part}/move`);
		await page.getByLabel('Bin', { exact: true }).fill('n2-1');
		await page.getByRole('button', { name: 'Move it' }).click();
		await expect(page.getByRole('status')).toContainText('Moved to N2-1');
		await page.getByRole('button', { name: 'Undo' }).first().click();
	});

	await test.step('price', async () => {
		await page.goto('/osiergate/prices/new');
		await page.getByLabel('Kind of part').selectOption({ label: 'Flywheel (with magnets)' });
		await page.getByLabel('Engine, maker and model').fill('Sollane PEAR-3');
		await page.getByLabel('Price of a new one').fill('88');
		await page.getByLabel('Source').fill('Counter book');
		await page.getByRole('button', { name: 'Save the price' }).click();
		await expect(page.getByRole('status')).toContainText('Saved: Flywheel');
	});
});
