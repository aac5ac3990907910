import type { Page } from '@playwright/test';
import { change, expect, ready, signIn, test } from '../support/browser';

const shop = '/osiergate';
const letters = () =>
	Array.from({ length: 4 }, () => String.fromCharCode(65 + Math.floor(Math.random() * 26))).join(
		''
	);

/** A rack of its own for each journey: two shelves of two slots. */
async function makeRack(page: Page): Promise<string> {
	const rack = letters();
	await page.goto(`${shop}/bins/rack`);
	await page.getByLabel('Letters of the rack').fill(rack);
	await page.getByLabel('Shelves').fill('2');
	await page.getByLabel('Slots on each').fill('2');
	await page.getByRole('button', { name: 'Make the rack' }).click();
	await expect(page.getByRole('status').first()).toContainText(`Rack ${rack}: 4 bins made`);
	return rack;
}

/** Old stock; returns its tag. */
const log = async (page: Page, more: object): Promise<string> =>
	(await change(page, 'parts', { kind: 'recoil', grade: 'good used', ...more })).tag;

const walk = (page: Page, name: string) => page.getByRole('button', { name: `Begin: ${name}` });
const card = (page: Page, tag: string) => page.getByRole('article').filter({ hasText: tag });
const where = async (page: Page, tag: string) => {
	const part = await page.request.get(`/api${shop}/parts/${tag}`);
	const { state, bin } = (await part.json()) as { state: string; bin: string | null };
	return [state, bin];
};

/** Leaves whatever walk of the shop goes on, so that the next one is about everything again. */
async function beginWalk(page: Page, name: string): Promise<void> {
	await page.goto(`${shop}/walks`);
	await walk(page, name).click();
	await page.waitForURL(/\/walks\/\d+$/);
}

const atPlace = async (page: Page, address: string) => {
	await page.getByRole('link', { name: new RegExp(`^${address}`) }).click();
	await expect(page.locator('.bin-large')).toContainText(address);
};

test('a rack is made in one go, renamed, merged and taken back', async ({ page }) => {
	await signIn(page, 'owner');
	const rack = await makeRack(page);
	await expect(page.getByRole('region', { name: `Rack ${rack}` }).getByRole('link')).toHaveCount(4);
	await page.goto(`${shop}/bins?shade=age`);
	await expect(page.getByRole('link', { name: 'Age of its parts' })).toHaveAttribute(
		'aria-current',
		'true'
	);

	const tag = await log(page, { bin: `${rack}1-1` });
	await page.goto(`${shop}/bins/${rack}1-1`);
	await ready(page);
	await page.locator('summary', { hasText: 'Change this bin' }).click();
	await page.getByLabel('Kinds that belong here').fill('pull start\nnot a kind zzqx');
	await page.getByRole('button', { name: 'Save the bin' }).click();
	await expect(page.getByRole('alert').or(page.locator('.ask-error')).first()).toContainText(
		'No kind goes by'
	);
	await page.getByLabel('Kinds that belong here').fill('pull start');
	await page.getByLabel('Address').fill(`${rack}2-9`);
	await page.getByRole('button', { name: 'Save the bin' }).click();
	await expect(page.getByText(/^Kept for .*Recoil/)).toBeVisible();
	expect(await where(page, tag)).toEqual(['shelved', `${rack}2-9`]);

	await ready(page);
	await page.locator('summary', { hasText: 'Merge it' }).click();
	await page.getByLabel('Bin that takes').fill(`${rack}2-1`);
	await page.getByRole('button', { name: 'Merge', exact: true }).click();
	await expect(page.getByRole('status').first()).toContainText(`1 part moved to ${rack}2-1`);
	expect(await where(page, tag)).toEqual(['shelved', `${rack}2-1`]);
	await page.getByRole('button', { name: 'Undo', exact: true }).click();
	await expect(page.getByRole('status').first()).toContainText('Undone');
	expect(await where(page, tag)).toEqual(['shelved', `${rack}2-9`]);
});

test('a count with one part in the wrong bin and one missing', async ({ page, browser }) => {
	await signIn(page, 'bench');
	const rack = await makeRack(page);
	const there = await log(page, { bin: `${rack}1-1` });
	const gone = await log(page, { bin: `${rack}1-1`, kind: 'muffler' });
	const astray = await log(page, { bin: `${rack}2-1`, kind: 'cup' });
	await beginWalk(page, 'Count');
	const address = new URL(page.url()).pathname;
	while ((await page.getByRole('link', { name: new RegExp(`^${rack}1-1`) }).count()) === 0)
		await beginWalk(page, 'Count');

	await atPlace(page, `${rack}1-1`);
	await card(page, gone)
		.getByRole('button', { name: /^Not there/ })
		.click();
	await expect(page.getByRole('status').filter({ hasText: 'not there' })).toBeVisible();
	expect(await where(page, gone)).toEqual(['missing', `${rack}1-1`]);

	await page.getByLabel(`Something else lies in ${rack}1-1?`).fill('zz');
	await page.getByRole('button', { name: 'Look it up' }).click();
	await expect(page.getByText('Nothing here carries the tag')).toBeVisible();
	await page.getByLabel(`Something else lies in ${rack}1-1?`).fill(astray);
	await page.getByRole('button', { name: 'Look it up' }).click();
	await expect(page.getByText(`It belongs in ${rack}2-1.`)).toBeVisible();
	await page.getByRole('button', { name: `It stays in ${rack}1-1` }).click();
	await expect(page.getByRole('status').filter({ hasText: `moved to ${rack}1-1` })).toBeVisible();
	expect(await where(page, astray)).toEqual(['shelved', `${rack}1-1`]);

	await test.step('goes on on another phone', async () => {
		const other = await (await browser.newContext()).newPage();
		await signIn(other, 'owner');
		await other.goto(new URL(page.url()).pathname);
		await atPlace(other, `${rack}1-1`);
		await other.getByRole('button', { name: 'It is there' }).click();
		await expect(other.getByRole('status').filter({ hasText: 'answer noted' })).toBeVisible();
		await other.context().close();
	});
	expect(await where(page, there)).toEqual(['shelved', `${rack}1-1`]);
	await page.goto(new URL(page.url()).pathname);
	await page.getByRole('button', { name: 'Leave it here' }).click();
	await expect(page.getByRole('heading', { level: 1 })).toContainText('Count: over');
	await expect(page.getByRole('link', { name: gone })).toBeVisible();

	await test.step('the missing one turns up by a later scan', async () => {
		await page.goto(`${shop}/parts/${gone}`);
		await page.getByRole('button', { name: 'Found it' }).click();
		await expect(page.getByRole('status').first()).toContainText('Back where it belongs');
		expect(await where(page, gone)).toEqual(['shelved', `${rack}1-1`]);
	});
	expect(address).toMatch(/\/walks\/\d+$/);
});

test('putting away leads a part to its bin, in one tap', async ({ page }) => {
	await signIn(page, 'bench');
	const rack = await makeRack(page);
	const tag = await log(page, { kind: 'chutecrank', engine: rack });
	await page.goto(`${shop}/bins/${rack}1-2`);
	await ready(page);
	await page.locator('summary', { hasText: 'Change this bin' }).click();
	await page.getByLabel('Kinds that belong here').fill('chute crank');
	await page.getByRole('button', { name: 'Save the bin' }).click();
	await expect(page.getByText(/^Kept for .*chute/i)).toBeVisible();

	await page.goto(`${shop}/parts/${tag}/move`);
	await expect(page.getByRole('button', { name: `Move to ${rack}1-2` })).toContainText(
		'named for it'
	);

	await beginWalk(page, 'Put away');
	await atPlace(page, `${rack}1-2`);
	await page.getByRole('button', { name: `Put in ${rack}1-2` }).click();
	await expect(page.getByRole('status').filter({ hasText: 'answer noted' })).toBeVisible();
	expect(await where(page, tag)).toEqual(['shelved', `${rack}1-2`]);
	await page.goto(new URL(page.url()).pathname);
	const over = page.getByRole('heading', { level: 1, name: /over/ });
	const leave = page.getByRole('button', { name: 'Leave it here' });
	await expect(over.or(leave)).toBeVisible();
	if (await leave.isVisible()) await leave.click();
	await expect(over).toBeVisible();
	await change(page, `parts/${tag}/scrap`, { reason: 'the journey is over' });
	await change(page, `bins/${rack}1-2/retire`, {});
});

test('a purge: scrap one, keep one, the kilos are said', async ({ page }) => {
	await signIn(page, 'owner');
	const rack = await makeRack(page);
	const tags = [await log(page, { bin: `${rack}1-1`, kind: 'bracket', engine: rack })];
	tags.push(await log(page, { bin: `${rack}1-1`, kind: 'bracket', engine: rack }));
	const priced = await page.request.put(`/api${shop}/prices`, {
		data: { kind: 'bracket', engine: rack, newCents: 100, source: 'list', seenOn: '2026-03-01' },
		headers: { 'Idempotency-Key': crypto.randomUUID(), origin: new URL(page.url()).origin }
	});
	expect(priced.status(), await priced.text()).toBe(200);

	await beginWalk(page, 'Purge');
	await atPlace(page, `${rack}1-1`);
	await expect(card(page, tags[0]!)).toContainText('not worth its place');
	await expect(page.getByRole('table').filter({ hasText: 'As scrap' })).toBeVisible();
	await card(page, tags[0]!)
		.getByRole('button', { name: /^Scrap it/ })
		.click();
	await expect(page.getByRole('status').filter({ hasText: 'scrapped' })).toBeVisible();
	expect(await where(page, tags[0]!)).toEqual(['scrapped', null]);
	await page.getByRole('status').getByRole('button', { name: 'Undo' }).click();
	await expect(page.getByRole('status').filter({ hasText: 'Undone' })).toBeVisible();
	expect(await where(page, tags[0]!)).toEqual(['shelved', `${rack}1-1`]);
	await atPlace(page, `${rack}1-1`);
	await card(page, tags[1]!)
		.getByRole('button', { name: /^Keep it/ })
		.click();
	await expect(page.getByRole('status').filter({ hasText: 'kept' })).toBeVisible();
	await page.getByRole('button', { name: 'Leave it here' }).click();
	await expect(page.getByRole('heading', { level: 1 })).toContainText('Purge: over');
	await expect(page.getByText('kept: 1')).toBeVisible();
});

test.describe('the red bin', () => {
	test.use({ expectedComplaints: [/409/] });
	test('nothing leaves the red bin untested', async ({ page }) => {
		await signIn(page, 'owner');
		const rack = await makeRack(page);
		const tag = await log(page, { bin: `${rack}1-1`, kind: 'coil', engine: rack });
		await page.goto(`${shop}/parts/${tag}/move`);
		await page.getByLabel('Bin', { exact: true }).fill('R1-1');
		await page.getByRole('button', { name: 'Move it' }).click();
		await expect(page.getByRole('status').first()).toContainText('Moved to R1-1');

		await page.goto(`${shop}/bins/red`);
		await expect(card(page, tag)).toContainText('Test it');
		await page.goto(`${shop}/parts/${tag}/move`);
		await page.getByLabel('Bin', { exact: true }).fill(`${rack}1-1`);
		await page.getByRole('button', { name: 'Move it' }).click();
		await expect(page.getByText(/red bin until a test is passed/).first()).toBeVisible();
		expect(await where(page, tag)).toEqual(['back', 'R1-1']);
	});
});
