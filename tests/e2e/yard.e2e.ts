import type { Page } from '@playwright/test';
import { expect, signIn, test } from '../support/browser';

const dayFrom = (days: number) =>
	new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10);

async function takeIn(page: Page, model: string): Promise<string> {
	await page.goto('/osiergate/donors/new');
	await page.getByLabel('Model').fill(model);
	await page.getByRole('button', { name: 'Take in' }).click();
	await expect(page.getByRole('heading', { level: 1 })).toContainText(model);
	return /donors\/(D\d+)/.exec(page.url())![1]!;
}

test('under hold nothing moves; then signed, stripped, finished, taken to the scrap, and in the book', async ({
	page
}) => {
	await signIn(page, 'owner');
	const donor = await takeIn(page, `TARN-HOLD-${Date.now() % 100000}`);
	const at = `/osiergate/donors/${donor}`;

	await page.goto(`${at}/release`);
	await page.getByRole('button', { name: 'Record the release' }).click();
	await expect(page.getByText('Enter who gives it.').first()).toBeVisible();
	await page.getByLabel('Name of who gives it').fill('Tobin Aske');
	await page.getByLabel(/^Kept whole until/).fill(dayFrom(7));
	const canvas = page.getByLabel('Sign here with a finger');
	await canvas.evaluate((node) => node.scrollIntoView({ block: 'center' }));
	const pad = (await canvas.boundingBox())!;
	await page.mouse.move(pad.x + 30, pad.y + 30);
	await page.mouse.down();
	for (const step of [60, 120, 180]) await page.mouse.move(pad.x + step, pad.y + 40 + (step % 50));
	await page.mouse.up();
	const signed = () =>
		page.locator('input[name=file]').evaluate((field: HTMLInputElement) => field.files?.length);
	await expect.poll(signed).toBe(1);
	await page.getByRole('button', { name: 'Record the release' }).click();
	await expect(page.getByRole('status')).toContainText('Release signed');
	await expect(page.getByText(/Hold date is/).first()).toBeVisible();
	await expect(page.getByRole('button', { name: 'Put on the bench' })).toBeDisabled();

	// a newer entry that puts the day right
	await page.getByLabel('Why the shop may take it apart').selectOption('signed');
	await page.getByLabel('Why a newer entry').fill('the town keeps for no days');
	await page.getByRole('button', { name: 'Record a newer release' }).click();
	await expect(page.getByRole('status')).toContainText('Release recorded');

	await page.getByLabel('Cause of death').selectOption('no-oil');
	await page.getByRole('radio', { name: /^Seen/ }).check();
	await page.getByRole('button', { name: 'Save the cause' }).click();
	await expect(page.getByRole('status')).toContainText('Cause of death saved');
	const safe = page.getByRole('group', { name: 'Safe to store' });
	for (const tick of await safe.getByRole('checkbox').all()) await tick.check();
	await page.getByRole('button', { name: 'Save the ticks' }).click();
	await expect(page.getByRole('status')).toContainText('Ticks saved');
	await page.getByRole('button', { name: 'Put on the bench' }).click();
	await expect(page.getByRole('status')).toContainText('On the bench');

	await page.getByRole('link', { name: 'Finish' }).click();
	await expect(page.getByRole('heading', { name: 'Its first account' })).toBeVisible();
	await page.getByLabel('What is left of it weighs').fill('heavy');
	await page.getByRole('button', { name: 'Stripped' }).click();
	await expect(page.getByText(/in kilograms, like 21.5/).first()).toBeVisible();
	await page.getByLabel('What is left of it weighs').fill('12,5');
	await page.getByLabel('Oil drained', { exact: true }).check();
	await page.getByRole('button', { name: 'Stripped' }).click();
	await expect(page.getByRole('status')).toContainText('Stripped');

	await page.goto('/osiergate/scrap/new');
	await page.getByLabel('Who bought it').fill('Harbour Metals');
	for (const box of await page
		.getByRole('group', { name: 'Carcasses that go' })
		.getByRole('checkbox')
		.all())
		await box.uncheck();
	await page.getByRole('checkbox', { name: new RegExp(`^${donor} `) }).check();
	await expect(page.getByText('ticked: about 12.5 kg')).toBeVisible();
	await page.getByRole('button', { name: 'Write it down' }).click();
	await expect(page.getByText('Enter the kilograms of one class at least').first()).toBeVisible();
	await page.getByLabel('irony aluminium (steel still in), kg').fill('12.2');
	await page.getByLabel('irony aluminium (steel still in), money').fill('4.27');
	await page.getByRole('button', { name: 'Write it down' }).click();
	await expect(page.getByRole('heading', { name: /^Scrap run \d+/ })).toBeVisible();
	await expect(page.getByText('$4.27').last()).toBeVisible();

	await page.getByRole('link', { name: donor }).click();
	await expect(page.getByText('gone', { exact: true })).toBeVisible();
	await page.getByText('Bring it back').first().click();
	await page.getByLabel('Because').fill('it never left');
	await page.getByRole('button', { name: 'Bring it back' }).click();
	await expect(page.getByRole('status')).toContainText('It is back');
	await expect(page.getByText('stripped', { exact: true })).toBeVisible();

	await page.goto(`/osiergate/register?q=${donor}`);
	const entries = page.getByRole('row', { name: new RegExp(donor) });
	await expect(entries).toHaveCount(2);
	await expect(entries.first()).toContainText('the town keeps for no days');
	await expect(entries.last()).toContainText('Tobin Aske');
	await expect(entries.last().getByRole('link', { name: 'signed paper' })).toBeVisible();
	await page.getByRole('link', { name: 'Print these' }).click();
	await expect(page.getByRole('heading', { name: /register of engines/ })).toBeVisible();
});

test('what is drained and taken away is written down, and put right where it was wrong', async ({
	page
}) => {
	await signIn(page, 'bench');
	await page.goto('/osiergate/scrap/waste');
	await page.getByLabel('Litres').fill('0.6');
	await page.getByLabel('Taken away', { exact: true }).check();
	await page.getByRole('button', { name: 'Write it down' }).click();
	await expect(page.getByText('Say who took it away.').first()).toBeVisible();
	await expect(page.getByLabel('Litres')).toHaveValue('0.6');
	await page.getByLabel('Into the can').check();
	await page.getByLabel('Litres').fill('1.25');
	await page.getByRole('button', { name: 'Write it down' }).click();
	await expect(page.getByRole('status')).toContainText('Written down');
	const entry = page.getByRole('listitem').filter({ hasText: '1.25 l used oil into the can' });
	await entry.first().getByRole('button', { name: 'Was wrong' }).click();
	await expect(page.getByRole('status')).toContainText('Taken out of the sums');
	await expect(entry.first()).toContainText('put right');
});
