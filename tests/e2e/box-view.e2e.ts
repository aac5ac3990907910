import { AxeBuilder } from '@axe-core/playwright';
import type { APIRequestContext, Locator, Page } from '@playwright/test';
import { randomUUID } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { SAFE_TICKS } from '../../src/lib/trade';
import { expect, ready, signIn, test } from '../support/browser';
import { visitor } from '../support/visitor';

const SHOP = '/api/osiergate';

async function change(who: APIRequestContext, path: string, data: object, method = 'post') {
	const headers = { 'idempotency-key': randomUUID() };
	const answer = await who.fetch(`${SHOP}/${path}`, { method, data, headers });
	expect(answer.ok(), `${method} ${path}: ${await answer.text()}`).toBe(true);
	return answer.json();
}

/** A donor on the bench, with a photo of its box. */
async function boxedDonor(): Promise<{ donor: string; tag: string; photo: number }> {
	const bench = await visitor('bench@osiergate.example');
	const what = {
		maker: 'Grauvik',
		model: `BX-${Date.now().toString(36)}`,
		class: 'GP',
		fittings: ['recoil']
	};
	const { number, tag } = await change(bench, 'donors', {
		...what,
		cause: 'stale-fuel',
		sureness: 'seen'
	});
	await change(bench, `donors/${number}/release`, { route: 'own' });
	await change(bench, `donors/${number}`, { safeTicks: SAFE_TICKS.map(({ id }) => id) }, 'patch');
	await change(bench, `donors/${number}/strip`, {});
	const buffer = await readFile('fixtures/photos/box.jpg');
	const sent = await bench.post(`${SHOP}/donors/${number}/photos`, {
		headers: { 'idempotency-key': randomUUID() },
		multipart: { shot: 'box', file: { name: 'box.jpg', mimeType: 'image/jpeg', buffer } }
	});
	const { id } = await sent.json();
	await bench.dispose();
	return { donor: number, tag, photo: id };
}

const stageOf = (page: Page) => page.getByRole('application');
const pin = (page: Page, name: RegExp) => stageOf(page).getByRole('link', { name });
const row = (page: Page, name: RegExp) =>
	page.locator('ol li').filter({ has: page.getByRole('button', { name }) });

/** Taps the picture at a share of its stage. */
async function tap(stage: Locator, x: number, y: number): Promise<void> {
	const { width, height } = (await stage.boundingBox())!;
	await stage.tap({ position: { x: width * x, y: height * y } });
}

const zoomOf = (stage: Locator) =>
	stage
		.locator('.sheet')
		.evaluate((sheet) => Number(getComputedStyle(sheet).getPropertyValue('--zoom')));
/** Where a point of the picture is seen, from the left edge of the stage. */
const seenAt = async (stage: Locator, mark: Locator) => {
	const [on, at] = [(await stage.boundingBox())!, (await mark.boundingBox())!];
	return {
		x: (at.x + at.width / 2 - on.x) / on.width,
		y: (at.y + at.height / 2 - on.y) / on.height
	};
};

test('a box photo: pins by thumb, seen in picture and list, and what is seen becomes parts', async ({
	page
}) => {
	const { donor, tag, photo } = await boxedDonor();
	await signIn(page, 'bench');
	await page.goto(`/osiergate/donors/${donor}`);
	await ready(page);
	await page
		.getByRole('link', { name: /the box/ })
		.first()
		.click();
	await expect(page).toHaveURL(new RegExp(`/donors/${donor}/photos/${photo}`));
	await ready(page);
	const stage = stageOf(page);
	const said = page.getByRole('status').filter({ hasText: /Pin|logged|Undone|shows/i });

	await test.step('tap, name it, done', async () => {
		await tap(stage, 0.28, 0.33);
		const form = page.getByRole('form', { name: 'A pin here' });
		await form.getByRole('searchbox').fill('coil');
		await form.getByRole('button', { name: /^Ignition coil/ }).click();
		await expect(said).toContainText('Pin 1 set');
		await expect(form).toHaveCount(0);
		await tap(stage, 0.7, 0.4);
		await form.getByRole('searchbox').fill('recoil');
		await form
			.getByRole('button', { name: /^Recoil/ })
			.first()
			.click();
		await expect(said).toContainText('Pin 2 set');
		const at = await seenAt(stage, pin(page, /^1, Ignition coil.*still on it/));
		expect(at.x).toBeCloseTo(0.28, 1);
		expect(at.y).toBeCloseTo(0.33, 1);
	});

	await test.step('list and picture light up together', async () => {
		await row(page, /^2, /).getByRole('button', { name: /^2, / }).click();
		await expect(pin(page, /^2, /)).toHaveClass(/lit/);
		await expect(pin(page, /^1, /)).not.toHaveClass(/lit/);
		await pin(page, /^1, /).tap();
		await expect(row(page, /^1, /)).toHaveClass(/lit/);
		await expect(pin(page, /^1, /)).toHaveClass(/lit/);
	});

	await test.step('nothing of it stands in anybody’s way', async () => {
		const viewport = page.viewportSize()!;
		await page.setViewportSize({ width: 360, height: 2400 });
		await tap(stage, 0.9, 0.1);
		const { violations } = await new AxeBuilder({ page }).analyze();
		expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html.slice(0, 160)}`)).toEqual([]);
		await page.getByRole('button', { name: 'Leave it' }).click();
		await page.setViewportSize(viewport);
	});

	await test.step('moved without dragging, and put back by undo', async () => {
		await row(page, /^1, /).getByRole('button', { name: /^1, / }).click();
		await row(page, /^1, /).getByRole('button', { name: 'Move or change it' }).click();
		await tap(stage, 0.5, 0.8);
		await page.getByRole('button', { name: 'Put it here' }).click();
		await expect(said).toContainText('Pin 1 moved');
		await expect.poll(async () => (await seenAt(stage, pin(page, /^1, /))).y).toBeCloseTo(0.8, 1);
		await page.getByRole('button', { name: 'Undo' }).click();
		await expect(said).toContainText('Undone');
		await expect.poll(async () => (await seenAt(stage, pin(page, /^1, /))).y).toBeCloseTo(0.33, 1);
	});

	await test.step('the kinds seen become parts in one go, in their box; one undo takes all back', async () => {
		await page.getByText('Log what you see').click();
		await expect(page.getByRole('checkbox', { name: /^Ignition coil/ })).toBeChecked();
		await page
			.getByRole('checkbox', { name: /^Muffler/ })
			.first()
			.check();
		await page
			.getByRole('combobox', { name: /^Grade of Muffler/ })
			.first()
			.selectOption('usable');
		await page.getByRole('radio', { name: /^good used/ }).check();
		await page.getByRole('button', { name: 'Log these 3 parts' }).click();
		await expect(said).toContainText('3 parts logged');
		await expect(pin(page, /^1, Ignition coil[^,]*$/)).toBeVisible();
		await expect(row(page, /^1, /)).toContainText(/good used · shelved/);
		await expect(row(page, /^1, /)).toContainText(tag);
		await page.getByRole('button', { name: 'Undo' }).click();
		await expect(said).toContainText('Undone');
		await expect(pin(page, /^1, .*still on it/)).toBeVisible();
	});

	await test.step('what the photo shows is changed, and a pin taken away', async () => {
		await page.getByText('What the photo shows').click();
		await page.getByLabel('It shows').selectOption('front');
		await page.getByRole('button', { name: 'Save', exact: true }).click();
		await expect(said).toContainText('The photo shows front');
		await row(page, /^2, /).getByRole('button', { name: /^2, / }).click();
		await page.getByRole('button', { name: 'Take pin 2 away' }).click();
		await expect(pin(page, /^2, /)).toHaveCount(0);
		await page.getByRole('button', { name: 'Undo' }).click();
		await expect(pin(page, /^2, /)).toBeVisible();
	});
});

test('closer by buttons, wheel, two fingers and keys, and a pin without any pointer', async ({
	page
}) => {
	const { donor, photo } = await boxedDonor();
	await signIn(page, 'bench');
	await page.goto(`/osiergate/donors/${donor}/photos/${photo}`);
	await ready(page);
	const stage = stageOf(page);
	const zoom = () => zoomOf(stage);

	await page.getByRole('button', { name: 'Closer' }).click();
	await expect.poll(zoom).toBeCloseTo(1.5, 3);
	await page.getByRole('button', { name: 'Farther' }).click();
	await expect.poll(zoom).toBe(1);

	const box = (await stage.boundingBox())!;
	await page.mouse.move(box.x + box.width / 4, box.y + box.height / 4);
	await page.mouse.wheel(0, -400);
	await expect.poll(zoom).toBeGreaterThan(1.3);
	await page.getByRole('button', { name: 'Whole' }).click();

	const finger = (x: number, id: number) => ({
		x: box.x + box.width * x,
		y: box.y + box.height / 2,
		id
	});
	const cdp = await page.context().newCDPSession(page);
	const touch = (type: 'touchStart' | 'touchMove' | 'touchEnd', ...xs: number[]) =>
		cdp.send('Input.dispatchTouchEvent', { type, touchPoints: xs.map(finger) });
	await touch('touchStart', 0.4, 0.6);
	for (const out of [0.35, 0.3, 0.2]) await touch('touchMove', out, 1 - out);
	await touch('touchEnd');
	await expect.poll(zoom).toBeCloseTo(3, 0);
	await expect(page.getByRole('form', { name: 'A pin here' })).toHaveCount(0);

	await stage.focus();
	await page.keyboard.press('0');
	await expect.poll(zoom).toBe(1);
	await page.keyboard.press('+');
	await page.keyboard.press('Enter');
	for (let press = 0; press < 5; press += 1) await page.keyboard.press('ArrowRight');
	await page.keyboard.press('Shift+ArrowUp');
	await page.keyboard.press('Enter');
	await expect(page.getByRole('searchbox')).toBeFocused();
	await page.keyboard.type('coil');
	await page.keyboard.press('Tab');
	await page.keyboard.press('Enter');
	await expect(pin(page, /^1, /)).toBeVisible();
	await page.keyboard.press('Escape');
	await page.getByRole('button', { name: 'Whole' }).click();
	const at = await seenAt(stage, pin(page, /^1, /));
	expect(at.x).toBeCloseTo(0.5 + 0.1 / 1.5, 1);
	expect(at.y).toBeCloseTo(0.5, 1);
});

test('a ruler on the photo, and a length noted on its part', async ({ page }) => {
	const { donor, photo } = await boxedDonor();
	const bench = await visitor('bench@osiergate.example');
	const part = await change(bench, `donors/${donor}/parts`, {
		kind: 'carb-float',
		grade: 'untested'
	});
	await bench.dispose();
	await signIn(page, 'bench');
	await page.goto(`/osiergate/donors/${donor}/photos/${photo}`);
	await ready(page);
	const stage = stageOf(page);
	await page.getByRole('button', { name: 'Measure' }).click();
	await page.getByRole('button', { name: 'Set the ruler' }).click();
	await tap(stage, 0.2, 0.5);
	await tap(stage, 0.6, 0.5);
	await page.getByLabel('Length between them').fill('a thumb');
	await page.getByRole('button', { name: 'Set the ruler' }).click();
	await expect(page.locator('.ask-error')).toContainText('Enter the length');
	await page.getByLabel('Length between them').fill('4 in');
	await page.getByRole('button', { name: 'Set the ruler' }).click();
	await expect(page.getByText('Ruler set: 4 in')).toBeVisible();

	await page.getByRole('button', { name: 'Closer' }).click();
	await tap(stage, 0.3, 0.5);
	await tap(stage, 0.6, 0.5);
	await expect(page.locator('.read')).toContainText(/^2\.\d\d in ±0\.\d\d \(5\d\.\d mm/);
	await page.getByRole('radio', { name: '2 in', exact: true }).check();
	await page.getByLabel('What was measured').fill('bolt to bolt');
	await page.getByRole('button', { name: 'Note it on the part' }).click();
	await expect(page.getByText(`Noted on ${part.tag}: bolt to bolt`)).toBeVisible();
	await page.goto(`/osiergate/parts?q=${encodeURIComponent(`${donor} bolt to bolt 2 in`)}`);
	await expect(page.getByRole('link', { name: new RegExp(part.tag) }).first()).toBeVisible();
});

test('without scripts and as a reader the pins are read, and nothing can be changed', async ({
	browser
}) => {
	const { donor, photo } = await boxedDonor();
	const bench = await visitor('bench@osiergate.example');
	const made = await change(bench, `donors/${donor}/pins`, {
		photo,
		x: 0.25,
		y: 0.75,
		kind: 'coil'
	});
	expect(made).toMatchObject({ n: 1, kind: 'coil', part: null, photo });
	const listed = await (await bench.get(`${SHOP}/donors/${donor}/pins`)).json();
	expect(listed).toEqual({ items: [made] });
	const part = await change(bench, `donors/${donor}/parts`, { kind: 'recoil', grade: 'usable' });
	await change(bench, `donors/${donor}/pins`, { photo, x: 0.6, y: 0.3, part: part.tag });
	await bench.dispose();

	const context = await browser.newContext({ javaScriptEnabled: false });
	const page = await context.newPage();
	await signIn(page, 'reader');
	await page.goto(`/osiergate/donors/${donor}/photos/${photo}`);
	await expect(page.locator('ol li')).toHaveCount(2);
	const stage = page.getByRole('group', { name: /^The photo/ });
	const at = await seenAt(stage, stage.getByRole('link', { name: /^1, Ignition coil/ }));
	expect(at.x).toBeCloseTo(0.25, 2);
	expect(at.y).toBeCloseTo(0.75, 2);
	await expect(page.locator('main form')).toHaveCount(0);
	await stage.getByRole('link', { name: /^1, / }).click();
	await expect(page).toHaveURL(/#pin-1$/);
	await page.getByRole('link', { name: `Open ${part.tag}` }).click();
	await page.getByRole('link', { name: `${donor}, the box: pin 2` }).click();
	await expect(page).toHaveURL(new RegExp(`/photos/${photo}#pin-2$`));
	await context.close();
});

test('the six views are asked for as tiles, each taken by one tap', async ({ page }) => {
	const { donor } = await boxedDonor();
	await signIn(page, 'bench');
	await page.goto(`/osiergate/donors/${donor}`);
	await ready(page);
	const photos = page.getByRole('region', { name: 'Photos' });
	await expect(photos.getByText('Missing: 6.')).toBeVisible();
	const asked = page.waitForEvent('filechooser');
	await photos.getByRole('button', { name: /back$/ }).click();
	await (await asked).setFiles('fixtures/photos/label.jpg');
	const taken = photos.getByRole('link', { name: 'back, taken' });
	await expect(taken).toBeVisible();
	await expect(photos.getByText('Missing: 5.')).toBeVisible();
	await taken.click();
	await expect(page.getByRole('heading', { level: 1 })).toContainText(/: back$/);
});
