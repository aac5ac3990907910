import type { Page } from '@playwright/test';
import { change, expect, letterTo, ready, signIn, test } from '../support/browser';
import { BASE } from '../support/visitor';

const run = Date.now().toString(36).toUpperCase();
const SHOP = '/osiergate';

/** Looks again until the work in the background is done. */
const until = (page: Page, seen: () => Promise<void>) =>
	expect(async () => {
		await page.reload();
		await seen();
	}).toPass({ timeout: 20_000 });

test('somebody waits, a donor comes in, they are told by letter, and want no more of them', async ({
	page,
	browser
}) => {
	const engine = `Sollane WT-${run}`;
	const email = `ida-${run.toLowerCase()}@mail.example`;
	await signIn(page, 'owner');
	await page.goto(`${SHOP}/wants`);
	await page.getByRole('link', { name: 'Somebody waits' }).click();
	await ready(page);
	await page.getByRole('radio', { name: 'Somebody new' }).check();
	await page.getByLabel('Name', { exact: true }).fill(`Ida Quoyle ${run}`);
	await page.getByLabel('E-mail').fill('no address');
	await page.getByLabel('Engine, in any words').fill(engine.toLowerCase());
	await page.getByRole('button', { name: 'Put it on the list' }).click();
	await expect(page.getByRole('heading', { name: 'There is a problem' })).toBeVisible();
	await expect(page.getByLabel('Name', { exact: true })).toHaveValue(`Ida Quoyle ${run}`);
	await page.getByLabel('E-mail').fill(email);
	await page.getByLabel('Kind of part').selectOption('recoil');
	await page.getByLabel('The most they pay').fill('60');
	await page.getByRole('button', { name: 'Put it on the list' }).click();
	await expect(page.getByRole('status').first()).toContainText('is on the list');
	await expect(page.getByText('Nothing yet.')).toBeVisible();
	const want = new URL(page.url()).pathname;

	const [maker, model] = engine.split(' ');
	const what = { maker, model, class: 'GP', fittings: ['recoil'], cause: 'stale-fuel' };
	const donor = await change(page, 'donors', what);
	await page.goto(`${SHOP}/wants`);
	const card = page.getByRole('article').filter({ hasText: `Ida Quoyle ${run}` });
	await until(page, () => expect(card).toContainText('New: 1 answer here', { timeout: 500 }));
	await expect(page.getByRole('link', { name: /^More ?, \d+ new wants?/ })).toBeVisible();
	await page.goto(`${SHOP}/donors/${donor.number}`);
	await expect(page.getByRole('region', { name: 'Who waits' })).toContainText('Ida Quoyle');

	await page.goto(want);
	await expect(page.getByText('by the engine')).toBeVisible();
	await page.getByText('The words: read, copy, print').click();
	await expect(page.getByRole('textbox', { name: /an engine came in/ })).toHaveValue(
		/Recoil|recoil starter/
	);
	await page.getByRole('button', { name: 'Tell Ida by e-mail' }).click();
	await expect(page.getByRole('status').first()).toContainText('The letter is on its way');
	const letter = await letterTo(email);
	expect(letter.subject).toContain('an engine came in with your recoil starter');
	expect(letter.text).toContain(`An engine came in that still carries one: ${engine}.`);
	await until(page, () =>
		expect(page.getByRole('region', { name: 'Letters' })).toContainText('sent', { timeout: 500 })
	);
	await expect(page.getByRole('main').getByText('Told', { exact: true })).toBeVisible();

	const link = letter.links.find((one) => one.includes('/letters/'))!;
	const reader = await (await browser.newContext({ baseURL: BASE })).newPage();
	await reader.goto(new URL(link).pathname);
	await reader.getByRole('button', { name: 'No more such letters' }).click();
	await expect(reader.getByRole('heading', { name: 'No more letters' })).toBeVisible();
	await reader.getByRole('button', { name: 'Write to me again after all' }).click();
	await expect(reader.getByRole('heading', { name: 'Letters from' })).toBeVisible();
	const oneTap = await fetch(new URL(new URL(link).pathname, BASE), {
		method: 'POST',
		headers: { 'content-type': 'application/x-www-form-urlencoded' },
		body: 'List-Unsubscribe=One-Click'
	});
	expect(oneTap.status).toBe(200);
	await reader.reload();
	await expect(reader.getByRole('heading', { name: 'No more letters' })).toBeVisible();
	await reader.goto('/letters/of-nobody-at-all-and-never-sent');
	await expect(reader.getByRole('heading', { name: 'This link is not known' })).toBeVisible();
	await reader.context().close();

	await page.reload();
	await expect(page.getByText('(wants no letters)')).toBeVisible();
	await expect(page.getByRole('button', { name: 'Tell Ida by e-mail' })).toHaveCount(0);
	await page.getByRole('button', { name: 'Said no' }).click();
	await expect(page.getByRole('main').getByText('Said no', { exact: true })).toBeVisible();
	await page.getByRole('button', { name: 'Undo' }).click();
	await expect(page.getByRole('status').first()).toContainText('Undone');
	await page.getByRole('button', { name: 'Got it' }).click();
	await expect(page.getByText('Got it', { exact: true }).first()).toBeVisible();
});

test('a search in vain becomes a want in one tap; a want moves the plan', async ({ page }) => {
	const engine = `Grauvik WV-${run}`;
	const [maker, model] = engine.split(' ');
	await signIn(page, 'owner');
	const what = { maker, model, class: 'R1', fittings: ['12 V start'], cause: 'stale-fuel' };
	const donor = await change(page, 'donors', what);
	const day = new Date().toISOString().slice(0, 10);
	const price = {
		kind: 'hourmeter',
		engine,
		newCents: 12_000,
		source: 'Counter book',
		seenOn: day
	};
	await change(page, 'prices', price, 'put');
	const plan = async () =>
		(await page.request.get(`/api${SHOP}/donors/${donor.number}/plan`)).json();
	const before = await plan();
	const waits = ({ order }: { order: { id: string; waitingFor: string | null }[] }) =>
		order.filter(({ waitingFor }) => waitingFor).map(({ id }) => id);
	expect(waits(before)).not.toContain('hourmeter');

	await page.goto(`${SHOP}/parts?q=${encodeURIComponent(`hour meter wv-${run}`)}`);
	await ready(page);
	await page.getByRole('link', { name: 'Somebody waits for it' }).click();
	await ready(page);
	await expect(page.getByLabel('Kind of part')).toHaveValue('hourmeter');
	await expect(page.getByLabel('Engine, in any words')).toHaveValue(`wv-${run.toLowerCase()}`);
	await page.getByRole('radio', { name: 'A job of our own' }).check();
	await page.getByLabel('The job').fill(`red tiller ${run}`);
	await page.getByRole('button', { name: 'Put it on the list' }).click();
	await expect(page.getByRole('status').first()).toContainText('1 answer here already');
	await expect(page.getByText(`On donor ${donor.number}`)).toBeVisible();

	const after = await plan();
	expect(waits(after)).toContain('hourmeter');
	expect(after.totalCents).toBeGreaterThan(before.totalCents);
	await page.getByRole('button', { name: 'Take it off the list' }).click();
	await expect(page.getByText('Taken off the list', { exact: true }).first()).toBeVisible();
	const again = await plan();
	expect(waits(again)).not.toContain('hourmeter');
	expect(again.totalCents).toBeLessThan(after.totalCents);
});

test('a customer is found, changed, handed over and deleted', async ({ page }) => {
	await signIn(page, 'owner');
	await page.goto(`${SHOP}/customers/new`);
	await page.getByLabel('Name', { exact: true }).fill(`Perran Oates ${run}`);
	await page.getByLabel('Phone').fill('(555) 014-7733');
	await page.getByRole('button', { name: 'Enter the customer' }).click();
	// an earlier run may have left one with this number
	if (await page.getByRole('heading', { name: 'There is a problem' }).isVisible()) {
		await page.getByLabel('Phone').fill('');
		await page.getByRole('button', { name: 'Enter the customer' }).click();
	}
	await expect(page.getByRole('heading', { level: 1 })).toHaveText(`Perran Oates ${run}`);
	const here = new URL(page.url()).pathname;
	await page.goto(`${SHOP}/customers`);
	await page.getByLabel('A piece of the name or the number').fill(`oates ${run}`);
	await page.getByRole('button', { name: 'Look' }).click();
	await page.getByRole('link', { name: `Perran Oates ${run}` }).click();
	await expect(page).toHaveURL(new RegExp(`${here}$`));
	const file = await page.request.get(`${here}/export?as=csv`);
	expect(await file.text()).toContain(`Perran Oates ${run}`);
	await page.getByText('On their request').click();
	await page.getByRole('button', { name: `Delete Perran Oates ${run}` }).click();
	await expect(page.getByRole('status').first()).toContainText('Customer deleted');
	await page.goto(here);
	await expect(page.getByRole('heading', { level: 1 })).toHaveText('a customer');
	await expect(page.getByText('Perran')).toHaveCount(0);
});

test.describe('without scripts', () => {
	test.use({ javaScriptEnabled: false, expectedComplaints: [/status of 400/] });

	test('somebody waits, is told by phone, says no, and waits on', async ({ page }) => {
		await signIn(page, 'counter');
		await page.goto(`${SHOP}/wants/new`);
		await page.getByRole('radio', { name: 'Somebody new' }).check();
		await page.getByLabel('Name', { exact: true }).fill(`Hob Sennet ${run}`);
		await page.getByRole('button', { name: 'Put it on the list' }).click();
		await expect(page.getByRole('heading', { name: 'There is a problem' })).toBeVisible();
		await expect(page.getByLabel('Name', { exact: true })).toHaveValue(`Hob Sennet ${run}`);
		await page.getByLabel('Part number').fill(`QX-${run}`);
		await page.getByRole('button', { name: 'Put it on the list' }).click();
		await page.getByRole('button', { name: 'Told by phone' }).click();
		await expect(page.getByRole('status').first()).toContainText('Noted as told');
		await page.getByRole('button', { name: 'Said no' }).click();
		await page.getByRole('button', { name: 'Waits on' }).click();
		await expect(page.getByRole('main').getByText('Waiting', { exact: true })).toBeVisible();
		await page.getByText('History').click();
		await expect(page.getByText('Told by phone, Tamsel Yorrow')).toBeVisible();
	});
});
