import type { Page } from '@playwright/test';
import { change, expect, ready, signIn, test } from '../support/browser';
import { findShown, type Shown } from '../support/screens';

/** Words that blame, beg or leak. */
const UNSAID =
	/\b(invalid|please|oops|required|sorry|illegal|forbidden|undefined|null|NaN|object|expected|received|string)\b/i;

interface Bad {
	path: string;
	button: string;
	/** What is filled in wrongly, by the id of its field; nothing where emptiness is the fault. */
	typed?: Record<string, string>;
}

const badForms = (one: Shown): Bad[] => {
	const part = `/osiergate/parts/${one.part}`;
	const donor = `/osiergate/donors/${one.whole}`;
	return [
		{
			path: '/osiergate/donors/new',
			button: 'Take in',
			typed: { paid: 'a lot', maker: 'Sollane' }
		},
		{ path: donor, button: 'Save the cause' },
		{ path: donor, button: 'Record the release', typed: { document: 'on a napkin' } },
		{ path: donor, button: 'Save what it is', typed: { displacementCc: 'big', model: 'X' } },
		{ path: `/osiergate/donors/${one.bench}/log?kind=carb-float`, button: 'Kept' },
		{ path: '/osiergate/parts/new?kind=recoil', button: 'Kept', typed: { engine: 'Sollane' } },
		{ path: `${part}/edit`, button: 'Save', typed: { massGrams: 'heavy' } },
		{ path: `${part}/hold`, button: 'Hold it', typed: { until: '2031-01-01' } },
		{ path: `${part}/move`, button: 'Move it' },
		{ path: `${part}/move`, button: 'Move it', typed: { bin: 'nowhere 77' } },
		{ path: `${part}/use`, button: 'Sold', typed: { price: 'ten', to: 'a neighbour' } },
		{ path: `${part}/use`, button: 'Fitted' },
		{ path: `${part}/scrap`, button: 'Scrap it' },
		{ path: `${part}/prove`, button: 'Passed', typed: { note: 'held all day' } },
		{ path: `/osiergate/parts/${one.out}/back`, button: 'Take it back' },
		{ path: '/osiergate/bins/new', button: 'Add the bin', typed: { purpose: 'odds and ends' } },
		{ path: `/osiergate/bins/${one.bin}`, button: 'Save the bin', typed: { address: '' } },
		{ path: '/osiergate/prices/new', button: 'Save the price', typed: { number: 'A-1' } },
		{ path: `/osiergate/prices/${one.price}`, button: 'Save the price', typed: { new: 'dear' } },
		{ path: '/osiergate/people', button: 'Send the invitation', typed: { email: 'nobody' } },
		{ path: '/osiergate/people', button: 'Make a key' },
		{ path: '/osiergate/people/shop', button: 'Save the settings', typed: { name: '' } },
		{ path: '/osiergate/worth', button: 'Mark the engine' },
		{ path: '/osiergate/worth', button: 'Save the figures', typed: { copyCap: 'half' } }
	];
};

/** What stands in the fields that a person typed in, by id. */
const answers = (page: Page, button: string) =>
	page
		.getByRole('button', { name: new RegExp(`^${button}`) })
		.first()
		.evaluate((element) =>
			Object.fromEntries(
				[...((element as HTMLButtonElement).form?.elements ?? [])]
					.filter((one) => one.matches('input:not([type=hidden], [type=file]), select, textarea'))
					.map((one) => {
						const field = one as HTMLInputElement;
						return [field.id, /radio|checkbox/.test(field.type) ? field.checked : field.value];
					})
			)
		);

async function sendBadly(page: Page, { path, button, typed = {} }: Bad): Promise<void> {
	await page.goto(path);
	// The scripts set what is folded as they take over.
	if ((await page.locator('details').count()) > 0) await ready(page);
	await page.evaluate(() => {
		for (const details of document.querySelectorAll('details')) details.open = true;
	});
	for (const [id, value] of Object.entries(typed)) await page.locator(`[id="${id}"]`).fill(value);
	const before = await answers(page, button);
	await page
		.getByRole('button', { name: new RegExp(`^${button}`) })
		.first()
		.click();
	const summary = page.locator('.problem');
	await expect(summary.getByRole('heading', { name: 'There is a problem' })).toBeVisible();
	await expect(summary).toBeFocused();
	await expect(page).toHaveTitle(/^Error: /);
	for (const link of await summary.getByRole('link').all()) {
		const href = (await link.getAttribute('href')) ?? '';
		const field = page.locator(`[id="${href.slice(1)}"]`);
		await expect(field, `${path}: where ${href} leads`).toHaveCount(1);
		await expect(field).toBeVisible();
		const said = (await link.textContent()) ?? '';
		expect(said, path).not.toMatch(UNSAID);
		await expect(page.locator('.ask-error', { hasText: said }).first()).toBeVisible();
	}
	expect(await answers(page, button), `${path}: answers kept`).toEqual(before);
}

// A refused form is answered by 400, which the browser notes by itself.
test.use({ expectedComplaints: [/status of 4\d\d/], trace: 'off' });

test('a form with a fault says so at the top and at the field, and keeps every answer', async ({
	page
}) => {
	test.setTimeout(120_000);
	await signIn(page, 'owner');
	const { number } = await change(page, 'donors', { model: 'FORM-1' });
	for (const bad of badForms({ ...(await findShown(page)), whole: number }))
		await test.step(`${bad.path}: ${bad.button}`, () => sendBadly(page, bad));
});

test('forms for everybody do the same', async ({ page }) => {
	await sendBadly(page, {
		path: '/sign-up',
		button: 'Open the shop',
		typed: { shopName: 'Tarn Mill Engines', password: '' }
	});
	await page.goto('/sign-in');
	await page.getByLabel('E-mail').fill('owner@osiergate.example');
	await page.getByLabel('Password').fill('not the one');
	await page.getByRole('button', { name: 'Sign in', exact: true }).click();
	await expect(page.locator('.problem')).toBeFocused();
	await expect(page).toHaveTitle(/^Error: /);
	await expect(page.locator('.problem')).not.toContainText(UNSAID);
	await expect(page.getByLabel('E-mail')).toHaveValue('owner@osiergate.example');
});
