import { emissionScene } from '../../fixtures/pictures/emission-label';
import { toJpeg } from '../../fixtures/pictures/jpeg';
import { expect, signIn, test } from '../support/browser';

/** A label whose family names another size of engine than it says, and another year than its code. */
const label = () =>
	toJpeg(
		emissionScene({
			maker: 'Grauvik',
			family: 'HNGKS.2101AB',
			displacement: '420 cc',
			model: 'GV-42K',
			code: '05053104',
			serial: '7719024'
		})
	);

const READ = { timeout: 30_000 };

test('a plate is photographed, read, corrected and taken over', async ({ page }) => {
	await page.setViewportSize({ width: 390, height: 844 });
	await signIn(page, 'bench');

	await test.step('take it in with a photo of the plate and nothing else', async () => {
		await page.goto('/osiergate/donors/new');
		const photo = { name: 'plate.jpg', mimeType: 'image/jpeg', buffer: await label() };
		await page.getByLabel('Photo of the plate').setInputFiles(photo);
		await page.getByRole('button', { name: 'Take in' }).click();
		await expect(page.getByRole('heading', { level: 1 })).toContainText('Engine not read yet');
	});
	const donor = new URL(page.url()).pathname;

	await test.step('what was read is offered, none of it filled in', async () => {
		await page.getByRole('link', { name: 'Look over what was read' }).click(READ);
		await expect(page.getByRole('textbox', { name: /^Model/ })).toHaveValue('GV-42K');
		await expect(page.getByRole('textbox', { name: /^Displacement/ })).toHaveValue('420');
		await expect(page.getByRole('img', { name: 'Model on the photo' })).toBeVisible();
		for (const tick of await page.getByRole('checkbox').all()) await expect(tick).not.toBeChecked();
	});

	await test.step('a family that does not go with the rest is said', async () => {
		await expect(page.getByText('says 210 cc, the displacement says 420 cc')).toBeVisible();
		await expect(page.getByText('says model year 2017, the code says built in 2005')).toBeVisible();
	});

	await test.step('nothing ticked is nothing taken', async () => {
		await page.getByRole('button', { name: 'Take over what is ticked' }).click();
		await expect(page.getByRole('alert')).toContainText('Tick the lines that are right');
	});

	await test.step('accept some, correct one', async () => {
		await page.getByRole('checkbox', { name: 'Model is right' }).check();
		await page.getByRole('checkbox', { name: 'Displacement is right' }).check();
		await page.getByRole('checkbox', { name: 'Emission family is right' }).check();
		await page.getByRole('textbox', { name: /^Serial/ }).fill('77190?4');
		await expect(page.getByRole('checkbox', { name: 'Serial is right' })).toBeChecked();
		await page.getByRole('button', { name: 'Take over what is ticked' }).click();
		await expect(page.getByRole('status').first()).toContainText('Taken over from the plate');
		await expect(page.getByRole('heading', { level: 1 })).toContainText('GV-42K');
		await expect(page.getByText('Serial 77190?4')).toBeVisible();
		await expect(page.getByText('Model year 2017, 210 cc')).toBeVisible();
		await expect(page.getByText('says 210 cc, the displacement says 420 cc')).toBeVisible();
		await expect(page.getByText('Code 05053104')).toHaveCount(0);
	});

	await test.step('undone, it is as it was', async () => {
		await page.getByRole('button', { name: 'Undo', exact: true }).click();
		await expect(page.getByRole('status').first()).toContainText('As it was before');
		await expect(page.getByRole('heading', { level: 1 })).toContainText('Engine not read yet');
	});

	await test.step('it can be read again', async () => {
		await page.goto(`${donor}/label`);
		await page.getByRole('button', { name: 'Read it again' }).click();
		await expect(page.getByRole('textbox', { name: /^Model/ })).toHaveValue('GV-42K', READ);
	});
});

test.describe('without JavaScript', () => {
	test.use({ javaScriptEnabled: false });

	test('a plate is read and taken over by plain forms', async ({ page }) => {
		await signIn(page, 'bench');
		await page.goto('/osiergate/donors/new');
		const photo = { name: 'plate.jpg', mimeType: 'image/jpeg', buffer: await label() };
		await page.getByLabel('Photo of the plate').setInputFiles(photo);
		await page.getByRole('button', { name: 'Take in' }).click();
		const donor = new URL(page.url()).pathname;
		await expect(async () => {
			await page.goto(`${donor}/label`);
			await expect(page.getByRole('textbox', { name: /^Model/ })).toHaveValue('GV-42K', {
				timeout: 500
			});
		}).toPass(READ);
		await page.getByRole('checkbox', { name: 'Model is right' }).check();
		await page.getByRole('button', { name: 'Take over what is ticked' }).click();
		await expect(page.getByRole('heading', { level: 1 })).toContainText('GV-42K');
	});
});
