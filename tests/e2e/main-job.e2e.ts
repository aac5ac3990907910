import { expect, ready, signIn, test } from '../support/browser';

const NUMBER = 'QX-40-7715';

test('from a dead engine on the ramp to a part that anybody finds', async ({ page, browser }) => {
	await signIn(page, 'bench');

	await test.step('take it in on the ramp', async () => {
		await page.goto('/osiergate/donors');
		await page.getByRole('link', { name: 'Take in a donor' }).click();
		await page.getByLabel('Photo of the plate').setInputFiles('fixtures/photos/label.jpg');
		await page.getByLabel('Maker of the engine').fill('Ondrake');
		await page.getByLabel('Model').fill('TARN-33E');
		await page.getByLabel('Serial').fill('40?1-7');
		await page.getByRole('radio', { name: /rider, one cylinder/i }).check();
		await page.getByLabel('Machine it came off').fill('38 in lawn tractor');
		await page.getByRole('button', { name: 'Take in' }).click();
		await expect(page.getByRole('heading', { level: 1 })).toContainText('Ondrake TARN-33E');
	});
	const donor = new URL(page.url()).pathname;
	await expect(page.getByRole('button', { name: 'Put on the bench' })).toBeDisabled();

	await test.step('two photos at once', async () => {
		await ready(page);
		await page
			.locator('#photos-gallery')
			.setInputFiles(['fixtures/photos/box.jpg', 'fixtures/photos/label.jpg']);
		await expect(page.getByRole('list', { name: 'Photos on their way' })).toHaveCount(0, {
			timeout: 20_000
		});
		await expect(page.locator('main .strip img[src*="/photos/"]')).toHaveCount(3);
	});

	await test.step('why it died, that the shop may strip it, made safe', async () => {
		await page.getByLabel('Cause of death').selectOption('no-oil');
		await page.getByRole('radio', { name: /^Seen/ }).check();
		await page.getByRole('button', { name: 'Save the cause' }).click();
		await expect(page.getByRole('status').first()).toContainText(/cause/i);
		await page.getByLabel('Why the shop may take it apart').selectOption('signed');
		await page.getByLabel('Document').fill('release on job 2204');
		await page.getByRole('button', { name: 'Record the release' }).click();
		await expect(page.getByRole('status').first()).toContainText(/release/i);
		await page.locator('summary', { hasText: 'Release' }).click();
		await expect(page.getByText('release on job 2204').first()).toBeVisible();
		for (const tick of await page
			.getByRole('group', { name: 'Safe to store' })
			.getByRole('checkbox')
			.all())
			await tick.check();
		await page.getByRole('button', { name: 'Save the ticks' }).click();
		await expect(page.getByRole('button', { name: 'Put on the bench' })).toBeEnabled();
		await page.getByRole('button', { name: 'Put on the bench' }).click();
		await expect(page.getByRole('link', { name: 'Log a part' })).toBeVisible();
	});

	await test.step('log three parts, each in three taps', async () => {
		await page.getByRole('link', { name: 'Log a part' }).click();
		for (const [kind, grade] of [
			['Electric starter motor, 12 V', 'untested'],
			['Carburetor, float bowl', 'good used'],
			['Ignition coil', 'clean used']
		] as const) {
			await page.getByRole('link', { name: new RegExp(`^${kind}`) }).click();
			await page.getByRole('radio', { name: grade }).check();
			await page.getByRole('button', { name: /^Kept/ }).click();
			await expect(page.getByRole('status').first()).toContainText(/Undo/);
		}
		await expect(page.getByText('3 parts logged')).toBeVisible();
	});

	await test.step('label the starter and move it to a bin', async () => {
		await page.goto(donor);
		await page.getByRole('link', { name: /Electric starter motor/ }).click();
		await page.getByRole('link', { name: 'Change', exact: true }).click();
		await page.getByLabel('Part numbers').fill(NUMBER);
		await page.getByRole('button', { name: /Save/ }).click();
		await page.getByRole('link', { name: 'Move', exact: true }).click();
		await page.getByLabel('Bin', { exact: true }).fill('l2-1');
		await page.getByRole('button', { name: 'Move it' }).click();
		await page.waitForURL(/\/parts\/\w{5}\?done/);
		await expect(page.getByText('L2-1').first()).toBeVisible();
	});
	const part = new URL(page.url()).pathname;
	const tag = part.split('/').at(-1)!;

	await test.step('a number without a price asks for one', async () => {
		await expect(page.getByText('needs a price', { exact: false }).first()).toBeVisible();
	});

	const counter = await (await browser.newContext()).newPage();
	await test.step('the counter prices it and sees the verdict and its terms', async () => {
		await signIn(counter, 'counter');
		await counter.goto(part);
		await counter.getByRole('link', { name: 'Enter a price' }).click();
		await counter.getByLabel('Price of a new one').fill('136');
		await counter.getByLabel('Price of a copy').fill('58');
		await counter.getByLabel('Source').fill('Counter book');
		await counter.getByRole('button', { name: 'Save the price' }).click();
		await expect(counter).toHaveURL(new RegExp(tag));
		await expect(counter.getByText('keep', { exact: true }).first()).toBeVisible();
		await counter.getByText('How this is worked out').click();
		await expect(counter.getByText('ran without oil', { exact: false }).first()).toBeVisible();
		await expect(counter.getByText('Counter book', { exact: false }).first()).toBeVisible();
	});

	await test.step('anybody finds it by a misspelt name and by its number without dashes', async () => {
		const reader = await (await browser.newContext()).newPage();
		await signIn(reader, 'reader');
		await reader.goto('/osiergate/parts?q=startor+tarn-33e');
		await expect(reader.getByText(tag).first()).toBeVisible();
		await reader.goto('/osiergate/parts');
		await reader
			.getByLabel('Part, number or bin')
			.or(reader.getByPlaceholder('Part, number or bin'))
			.first()
			.fill('qx407715');
		await expect(reader.getByText(tag).first()).toBeVisible();
		await expect(reader.getByText('L2-1').first()).toBeVisible();
		await reader.goto(part);
		await expect(reader.getByText('keep', { exact: true }).first()).toBeVisible();
		await expect(reader.getByRole('link', { name: 'Move', exact: true })).toHaveCount(0);
	});
});
