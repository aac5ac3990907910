import { expect, letterTo, signIn, test } from '../support/browser';

// A refusal answers with a status that the browser notes.
test.use({ expectedComplaints: [/status of 4\d\d/] });

const stamp = Date.now().toString(36);
const phrase = 'a bench under the window';

test('a shop is opened, somebody invited, and shut out again at once', async ({
	page,
	browser
}) => {
	const owner = `owner-${stamp}@newshop.example`;
	await page.goto('/sign-up');
	await page.getByLabel('Name of the shop').fill('Quillet Small Engines');
	await page.getByLabel('Your name').fill('Merryn Voss');
	await page.getByLabel('E-mail').fill(owner);
	await page.getByLabel('Password').fill('too short');
	await page.getByRole('button', { name: 'Open the shop' }).click();
	await expect(page.getByRole('heading', { name: 'There is a problem' })).toBeVisible();
	await expect(page).toHaveTitle(/^Error:/);
	await expect(page.getByLabel('Your name')).toHaveValue('Merryn Voss');
	await page.getByLabel('Password').fill(phrase);
	await page.getByRole('button', { name: 'Open the shop' }).click();

	await page.getByLabel('E-mail').fill(owner);
	await page.getByLabel('Password').fill(phrase);
	await page.getByRole('button', { name: 'Sign in', exact: true }).click();
	await page.waitForURL(/quillet-small-engines/);
	const home = new URL(page.url()).pathname.split('/')[1];

	await page.goto(`/${home}/people`);
	const invited = `bench-${stamp}@newshop.example`;
	await page.getByLabel('E-mail').fill(invited);
	await page.getByLabel('Role', { exact: true }).selectOption('bench');
	await page.getByRole('button', { name: 'Send the invitation' }).click();
	await expect(page.getByRole('status')).toContainText('Invitation sent');

	const letter = await letterTo(invited);
	const bench = await (await browser.newContext()).newPage();
	await bench.goto(letter.links[0]!);
	await bench.getByLabel('Your name').fill('Corin Ash');
	await bench.getByLabel('Password').fill(phrase);
	await bench.getByRole('button', { name: 'Join' }).click();
	await bench.getByLabel('E-mail').fill(invited);
	await bench.getByLabel('Password').fill(phrase);
	await bench.getByRole('button', { name: 'Sign in', exact: true }).click();
	await bench.waitForURL(/quillet/);
	await bench.goto(`/${home}/people/shop`);
	await expect(bench.getByText('Only the owner can do this')).toBeVisible();

	await page.reload();
	await page
		.locator('.card', { hasText: 'Corin Ash' })
		.getByRole('button', { name: 'Shut out' })
		.click();
	await expect(page.getByText('shut out', { exact: true })).toBeVisible();
	const answer = await bench.goto(`/${home}/parts`);
	expect(answer?.status()).toBe(404);
});

test('a sign-in link comes by mail and works once; an unknown address gets the same answer', async ({
	page,
	browser
}) => {
	await page.goto('/sign-in');
	await page.getByLabel('E-mail').fill('reader@osiergate.example');
	await page.getByRole('button', { name: 'Send me a sign-in link instead' }).click();
	await expect(page.getByRole('heading', { name: 'Look in your mail' })).toBeVisible();
	const known = await page.getByRole('main').innerText();
	const link = (await letterTo('reader@osiergate.example')).links[0]!;
	await page.goto(link);
	await page.waitForURL(/osiergate/);

	const again = await (await browser.newContext()).newPage();
	await again.goto(link);
	await expect(again.getByText('That link was used already')).toBeVisible();

	await again.goto('/sign-in');
	await again.getByLabel('E-mail').fill(`nobody-${stamp}@nowhere.example`);
	await again.getByRole('button', { name: 'Send me a sign-in link instead' }).click();
	await expect(again.getByRole('heading', { name: 'Look in your mail' })).toBeVisible();
	expect(await again.getByRole('main').innerText()).toBe(known);
	const letter = await letterTo(`nobody-${stamp}@nowhere.example`);
	expect(letter.text).toContain('nobody signs in with it here');
	expect(letter.links.every((one) => !one.includes('token='))).toBe(true);
});

test('signing out ends the session on the server', async ({ page, context }) => {
	await signIn(page, 'counter');
	const cookies = await context.cookies();
	const session = cookies.find((one) => one.name.includes('session'));
	expect(session).toMatchObject({ httpOnly: true, sameSite: 'Lax', path: '/' });
	await page.goto('/osiergate/people');
	await page.getByRole('button', { name: 'Sign out' }).click();
	await page.waitForURL('/');
	await context.addCookies(cookies);
	await page.goto('/osiergate/parts');
	await expect(page).toHaveURL(/sign-in/);
});

test('who belongs to several shops chooses; who belongs to one goes straight in', async ({
	page
}) => {
	await signIn(page, 'bench');
	await expect(page).toHaveURL(/osiergate/);
	await page.goto('/choose-shop?all');
	await expect(page.getByRole('link', { name: /Osiergate Engine Bench/ })).toBeVisible();
	await expect(page.getByText('Thrennick')).toHaveCount(0);
});
