import type { Locator, Page } from '@playwright/test';
import { expect, signIn, test } from '../support/browser';
import { findShown } from '../support/screens';

/** Counts what a thumb does: taps, and characters typed. */
class Thumb {
	taps = 0;
	typed = 0;

	async tap(target: Locator): Promise<void> {
		this.taps++;
		await target.click();
	}

	async type(target: Locator, text: string): Promise<void> {
		this.taps++;
		this.typed += text.length;
		await target.fill(text);
	}
}

const said = (page: Page) => page.getByRole('status').first();

test('the tasks of every day take few taps', async ({ page }) => {
	await signIn(page, 'owner');
	const shown = await findShown(page);
	const part = `/osiergate/parts/${shown.part}`;

	await test.step('a donor: plate photo, 4 characters, class, save: 5 taps with the field', async () => {
		const thumb = new Thumb();
		await page.goto('/osiergate/donors');
		await thumb.tap(page.getByRole('link', { name: 'Take in a donor' }));
		const camera = page.getByLabel('Photo of the plate');
		await expect(camera).toHaveAttribute('capture', 'environment');
		const asked = page.waitForEvent('filechooser');
		await thumb.tap(camera);
		await (await asked).setFiles('fixtures/photos/label.jpg');
		await expect(page.getByRole('list', { name: 'Photos chosen' })).toContainText('label.jpg');
		await thumb.type(page.getByLabel('Model'), 'GP-9');
		await thumb.tap(page.getByRole('radio', { name: /walk-behind/i }));
		await thumb.tap(page.getByRole('button', { name: 'Take in' }));
		await expect(said(page)).toContainText('Taken in');
		expect(thumb).toMatchObject({ taps: 5, typed: 4 });
	});

	await test.step('a part: kind, grade, kept: 3 taps, nothing typed', async () => {
		await page.goto(`/osiergate/donors/${shown.bench}/log`);
		const thumb = new Thumb();
		await thumb.tap(
			page.getByRole('link', { name: /^(Carburetor, float|Muffler|Recoil)/ }).first()
		);
		await thumb.tap(page.getByRole('radio', { name: 'good used' }));
		await thumb.tap(page.getByRole('button', { name: /^Kept/ }));
		await expect(said(page)).toContainText('kept');
		expect(thumb).toMatchObject({ taps: 3, typed: 0 });
		await page.getByRole('button', { name: 'Undo' }).click();
		await expect(said(page)).toContainText(/undone/i);
	});

	await test.step('find a part and read its bin: 1 tap, 5 characters', async () => {
		await page.goto('/osiergate/parts');
		const thumb = new Thumb();
		await thumb.type(page.getByRole('searchbox'), shown.part);
		const card = page.getByRole('link', { name: new RegExp(shown.part) });
		await expect(page.locator('.tag', { has: card }).locator('.bin')).toBeVisible();
		await expect(page.locator('.tag')).toHaveCount(1);
		expect(thumb).toMatchObject({ taps: 1, typed: 5 });
	});

	await test.step('hold for a job of these days: 2 taps', async () => {
		await page.goto(part);
		const thumb = new Thumb();
		await thumb.tap(page.getByRole('link', { name: 'Hold', exact: true }));
		await thumb.tap(page.getByRole('button', { name: /^job / }).first());
		await expect(said(page)).toContainText('Held for job');
		expect(thumb.taps).toBe(2);
		await page.getByRole('button', { name: 'Free it' }).click();
		await expect(said(page)).toContainText('Freed');
	});

	await test.step('move by address: 3 taps with the field', async () => {
		await page.goto(part);
		const thumb = new Thumb();
		await thumb.tap(page.getByRole('link', { name: 'Move', exact: true }));
		await thumb.type(page.getByLabel('Bin', { exact: true }), 'n2-1');
		await thumb.tap(page.getByRole('button', { name: 'Move it' }));
		await expect(said(page)).toContainText('Moved to N2-1');
		expect(thumb.taps).toBe(3);
	});

	await test.step('sell at the asked price: 2 taps; take back with a reason: 2 taps', async () => {
		await page.goto(part);
		const sale = new Thumb();
		await sale.tap(page.getByRole('link', { name: 'Use or sell' }));
		await expect(page.getByLabel('Price', { exact: true })).not.toHaveValue('');
		await sale.tap(page.getByRole('button', { name: 'Sold', exact: true }));
		await expect(said(page)).toContainText('Sold');
		expect(sale).toMatchObject({ taps: 2, typed: 0 });
		const back = new Thumb();
		await back.tap(page.getByRole('link', { name: 'Take it back' }));
		await back.tap(page.getByRole('button', { name: 'does not fit' }));
		await expect(said(page)).toContainText('Taken back');
		expect(back).toMatchObject({ taps: 2, typed: 0 });
		await page.getByRole('button', { name: 'Undo', exact: true }).click();
		await expect(said(page)).toContainText(/undone/i);
	});
});
