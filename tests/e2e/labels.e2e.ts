import { writeFile } from 'node:fs/promises';
import { chromium, type APIRequestContext, type Page } from '@playwright/test';
import { decode, rasterOf } from '../support/decode';
import { filmOf } from '../support/film';
import { expect, ready, signIn, test } from '../support/browser';
import { BASE, visitor } from '../support/visitor';

const SHOP = '/osiergate';
const fresh = (prefix: string) =>
	`${prefix}${Date.now().toString(36).slice(-5)}${Math.floor(Math.random() * 1000)}`.toUpperCase();

async function post<T>(who: APIRequestContext, path: string, data: object): Promise<T> {
	const headers = { 'idempotency-key': crypto.randomUUID() };
	const answer = await who.post(`/api${SHOP}/${path}`, { data, headers });
	expect(answer.ok(), `${path}: ${answer.status()}`).toBe(true);
	return answer.json();
}

const makeParts = async (who: APIRequestContext, count: number): Promise<string[]> => {
	const tags: string[] = [];
	const coil = { kind: 'coil', grade: 'good used', engine: 'Sollane REEF-17' };
	while (tags.length < count) tags.push((await post<{ tag: string }>(who, 'parts', coil)).tag);
	return tags;
};
const makeBin = (who: APIRequestContext, address: string) =>
	post<{ tag: string; address: string }>(who, 'bins', { address, size: 'm' });

const binOf = async (who: APIRequestContext, tag: string) =>
	((await (await who.get(`/api${SHOP}/parts/${tag}`)).json()) as { bin: string | null }).bin;

const said = (page: Page) => page.getByRole('main').getByRole('status');

test('twenty labels are printed, and the parts put away by scanning them', async () => {
	test.setTimeout(180_000);
	const who = await visitor('bench@osiergate.example');
	const tags = await makeParts(who, 20);
	const { tag: bin, address } = await makeBin(who, fresh('SCAN '));
	const asked = `${[...tags, bin].map((tag) => `tag=${tag}`).join('&')}&stock=roll-62x29`;
	const pdf = await (await who.get(`${SHOP}/labels/pdf?${asked}`)).body();
	const labels = await rasterOf(pdf);
	const read = (await Promise.all(labels.map(decode))).flat();
	expect(read).toEqual([...tags, bin].map((tag) => `${BASE}/t/osiergate/${tag}`.toUpperCase()));

	const film = test.info().outputPath('bench.mjpeg');
	await writeFile(film, await filmOf(labels, 20));
	const args = [
		'--no-sandbox',
		'--use-fake-ui-for-media-stream',
		'--use-fake-device-for-media-stream'
	];
	const executablePath = process.env.CHROMIUM_PATH;
	const browser = await chromium.launch({
		...(executablePath ? { executablePath } : {}),
		args: [...args, `--use-file-for-fake-video-capture=${film}`]
	});
	try {
		const page = await browser.newPage({
			baseURL: BASE,
			viewport: { width: 390, height: 844 },
			permissions: ['camera']
		});
		const complaints: string[] = [];
		page.on('console', (line) => line.type() === 'error' && complaints.push(line.text()));
		page.on('pageerror', (fault) => complaints.push(fault.message));
		await signIn(page, 'bench');
		await page.goto(`${SHOP}/parts`);
		// One tap, then only scans.
		await page.getByRole('link', { name: 'Scan a tag' }).click();
		await expect(said(page)).toContainText(`put away in ${address}`, { timeout: 60_000 });
		await expect(async () => {
			expect(await Promise.all(tags.map((tag) => binOf(who, tag)))).toEqual(
				tags.map(() => address)
			);
		}).toPass({ timeout: 90_000 });
		expect(complaints).toEqual([]);
	} finally {
		await browser.close();
	}
	await who.dispose();
});

test('a code typed beside the camera does the same, and is taken back', async ({ page }) => {
	const who = await visitor('bench@osiergate.example');
	const [one, two] = (await makeParts(who, 2)) as [string, string];
	const { tag: bin, address } = await makeBin(who, fresh('TYPE '));
	await signIn(page, 'bench');
	await page.goto(`${SHOP}/scan`);
	await ready(page);
	const type = async (code: string) => {
		await page.getByLabel('Code on the tag').fill(code);
		await page.getByRole('button', { name: 'Take the code' }).click();
	};
	await type('nothing at all');
	await expect(page.getByRole('alert').filter({ hasText: 'is no tag' })).toBeVisible();
	await type(one.toLowerCase());
	await expect(page.getByRole('heading', { level: 1 })).toHaveText('1 part in hand');
	await type(two);
	await expect(page.getByRole('heading', { level: 1 })).toHaveText('2 parts in hand');

	await page.reload();
	await expect(page.getByRole('heading', { level: 1 })).toHaveText('2 parts in hand');
	await ready(page);
	await type(bin);
	await expect(said(page)).toContainText(`2 parts put away in ${address}`);
	expect(await binOf(who, one)).toBe(address);
	await said(page).getByRole('button', { name: 'Undo' }).click();
	await expect(said(page)).toContainText('2 parts are where they were');
	expect(await binOf(who, one)).toBeNull();

	await type(bin);
	await expect(page.getByRole('link', { name: `Open ${address}` })).toBeVisible();
	await type(two);
	await page.getByRole('link', { name: `Open ${two}` }).click();
	await expect(page).toHaveURL(new RegExp(`/parts/${two}$`));
	await who.dispose();
});

test('blank tags are made in advance, and the first scan says what each hangs on', async ({
	page
}) => {
	await signIn(page, 'bench');
	await page.goto(`${SHOP}/labels`);
	await page.getByLabel('How many blank tags').fill('3');
	await page.getByRole('button', { name: 'Make blank tags' }).click();
	await expect(page.getByRole('heading', { level: 1 })).toHaveText('3 labels');
	await ready(page);
	await page.getByRole('radio', { name: /^A4 sheet/ }).check();
	await expect(page).toHaveURL(/stock=a4/);
	await expect(page.getByText('3 blank tags on 1 sheet')).toBeVisible();
	const href = await page.getByRole('link', { name: 'Print 3 labels' }).getAttribute('href');
	const pdf = await (await page.request.get(href!)).body();
	const codes = await decode((await rasterOf(pdf))[0]!);
	expect(codes).toHaveLength(3);
	const tags = codes.map((code) => code.split('/').at(-1)!);

	await test.step('a part from before', async () => {
		await page.goto(new URL(codes[0]!).pathname);
		await expect(page.getByRole('heading', { level: 1 })).toHaveText('What does it hang on?');
		await page.getByRole('link', { name: 'A part from before: old stock' }).click();
		await page.getByRole('link', { name: /^Ignition coil/ }).click();
		await expect(page.getByText(`blank tag ${tags[0]}`)).toBeVisible();
		await page.getByRole('radio', { name: 'usable' }).check();
		await page.getByRole('button', { name: /^Kept:/ }).click();
		await expect(page.getByRole('status')).toContainText(tags[0]!);
		await page.goto(new URL(codes[0]!).pathname);
		await expect(page).toHaveURL(new RegExp(`/parts/${tags[0]}$`));
	});

	await test.step('the box of a new donor', async () => {
		await page.goto(new URL(codes[1]!).pathname);
		await page.getByRole('link', { name: 'The box of a new donor' }).click();
		await page.getByLabel('Model').fill('LOFT-9');
		await page.getByRole('button', { name: 'Take in' }).click();
		await expect(page.getByRole('status')).toContainText(`box ${tags[1]}`);
	});

	await test.step('a bin, after a slip', async () => {
		await page.goto(new URL(codes[2]!).pathname);
		await page.getByRole('link', { name: 'A bin', exact: true }).click();
		await page.getByRole('radio', { name: /^medium/ }).check();
		await page.getByRole('button', { name: 'Add the bin' }).click();
		await expect(page.getByRole('alert').first()).toBeVisible();
		await page.getByLabel('Address').fill(fresh('BLANK '));
		await page.getByRole('button', { name: 'Add the bin' }).click();
		await page.waitForURL(/done=Bin/);
		await page.goto(new URL(codes[2]!).pathname);
		await expect(page).toHaveURL(/\/bins\//);
	});
});

test('a stranger who scans learns whose tag it is only where the shop wants it', async ({
	page,
	browser
}) => {
	const who = await visitor('owner@osiergate.example');
	const [tag] = await makeParts(who, 1);
	const stranger = await (await browser.newContext({ baseURL: BASE })).newPage();
	const asks = async (path: string) => {
		await stranger.goto(path);
		return (await stranger.getByRole('heading', { level: 1 }).textContent()) ?? '';
	};
	const unknown = await asks('/T/NO-SUCH-SHOP/K7M3X');
	expect(await asks(`/T/OSIERGATE/${tag}`)).toBe(unknown);
	expect(await stranger.content()).not.toContain('REEF-17');

	await signIn(page, 'owner');
	await page.goto(`${SHOP}/labels/settings`);
	await page.getByRole('radio', { name: /^Say that it belongs/ }).check();
	await page.getByRole('button', { name: 'Save who is told' }).click();
	await expect(page.getByRole('status').first()).toContainText('Saved');
	expect(await asks(`/T/OSIERGATE/${tag}`)).toContain('This tag belongs to Osiergate');
	expect(await stranger.content()).not.toContain('REEF-17');
	expect(await asks('/T/OSIERGATE/0000A')).toBe(unknown);

	await page.getByRole('radio', { name: /^Keep it to ourselves/ }).check();
	await page.getByRole('button', { name: 'Save who is told' }).click();
	await expect(page.getByRole('radio', { name: /^Keep it/ })).toBeChecked();
	await who.dispose();
});
