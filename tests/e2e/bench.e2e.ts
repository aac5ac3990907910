import { chromium, type Locator, type Page } from '@playwright/test';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, ready, signIn, test } from '../support/browser';
import { change, donorOnBench, putOnBench, takeInFor } from '../support/strip';

const RIDER = { class: 'R1', fittings: ['12 V start', 'charging'] };

const kept = (page: Page) => page.getByRole('button', { name: /^Kept: / }).first();
const shown = (page: Page) => page.locator('h1#next');
const came = (page: Page) => page.getByRole('region', { name: 'Came off' }).getByRole('listitem');

/** One tap for the part that is shown: kept, or left on where it would have to pass a checklist first. */
async function answerButton(page: Page): Promise<Locator> {
	const checked = await page.getByRole('group', { name: /^Checklist/ }).count();
	const name = checked > 0 ? /^Left on: / : /^(Kept|Off, to scrap): /;
	return page.getByRole('button', { name }).first();
}

const tagOf = async (row: Locator) =>
	(await row.locator('.code').innerText()).replace(/^Tag\s*/, '').trim();

/** Opens the bench on one kind and waits until its scripts have taken over. */
async function bench(page: Page, donor: string, kind = ''): Promise<void> {
	await page.goto(`/osiergate/donors/${donor}/bench${kind && `?kind=${kind}`}`);
	await ready(page);
}

test('a seized rider engine: the look suggests, the person decides, the bench says why', async ({
	page
}) => {
	await signIn(page, 'bench');
	const donor = await takeInFor(page.request, RIDER);
	await page.goto(`/osiergate/donors/${donor}`);
	await page.getByRole('link', { name: 'One-minute triage' }).click();
	await page.getByRole('radio', { name: 'empty' }).check();
	await page.getByRole('radio', { name: 'solid' }).check();
	await page.getByRole('checkbox', { name: 'blue or yellow heat tints' }).check();
	await page.getByRole('button', { name: 'Keep the answers' }).click();
	await expect(page.getByText('Do not crank it', { exact: false }).first()).toBeVisible();
	await expect(page.getByText('Not on this engine: it must not be turned.')).toBeVisible();
	const first = page
		.getByRole('region', { name: 'What the answers suggest' })
		.locator('li')
		.first();
	await expect(first).toContainText('ran without oil, seized');
	await expect(first).toContainText('dry dipstick');
	await first.getByRole('button', { name: 'It is this' }).click();
	await expect(page.getByRole('status').first()).toContainText('ran without oil, seized, likely');
	await expect(first).toContainText('Named as the cause');

	await putOnBench(page.request, donor);
	await bench(page, donor, 'starter12');
	await expect(shown(page)).toHaveText('Electric starter motor, 12 V');
	await expect(page.getByText('Somebody pulled or cranked on a locked engine.')).toBeVisible();
	await page.getByRole('radio', { name: 'bench test cold' }).check();
	await page.getByLabel('Free run, current').fill('24');
	await page
		.getByRole('button', { name: /^Kept: Electric starter motor, 12 V, good used/ })
		.click();
	await expect(came(page).first()).toContainText('Electric starter motor');
	await page.goto(`/osiergate/parts/${await tagOf(came(page).first())}`);
	await expect(page.getByText('24 A')).toBeVisible();

	await bench(page, donor, 'rod');
	await expect(page.getByText('is never used again', { exact: false })).toBeVisible();
	await expect(kept(page)).toHaveCount(0);
});

test('the flywheel of an engine that ran too fast is refused and destroyed', async ({ page }) => {
	await signIn(page, 'bench');
	const donor = await donorOnBench(page.request, {
		...{ class: 'GE', fittings: ['recoil', 'charging'] },
		cause: 'overspeed'
	});
	await bench(page, donor, 'flywheel');
	await expect(shown(page)).toHaveText('Flywheel (with magnets)');
	await expect(page.getByText('Never stock')).toBeVisible();
	await expect(page.getByText('it may burst later', { exact: false }).first()).toBeVisible();
	await expect(kept(page)).toHaveCount(0);
	const refused = await page.request.post(`/api/osiergate/donors/${donor}/parts`, {
		headers: { 'Idempotency-Key': crypto.randomUUID(), origin: new URL(page.url()).origin },
		data: { kind: 'flywheel', grade: 'good used' }
	});
	expect(refused.status()).toBe(409);
	await page.getByText('Bad', { exact: true }).click();
	await page.getByRole('button', { name: 'Destroy it: Flywheel' }).click();
	await expect(came(page).first()).toContainText('destroyed');
	await expect(page.getByText('Photo of Flywheel', { exact: false })).toBeVisible();
});

test('a stale-fuel mower: all is good but what the fuel gummed', async ({ page }) => {
	await signIn(page, 'bench');
	const donor = await donorOnBench(page.request, {
		...{ class: 'WB', fittings: ['recoil'], offMachine: '21 in walk-behind mower' },
		cause: 'stale-fuel'
	});
	await change(page.request, 'post', `donors/${donor}/triage`, {
		answers: { turn: 'free', thumb: 'puff' },
		inPlace: { coil: { passed: true, figure: 6, unit: 'mm' } }
	});
	await bench(page, donor, 'carb-float');
	await expect(
		page.getByText('The fuel that stopped the engine gummed this first', { exact: false })
	).toBeVisible();
	await bench(page, donor, 'coil');
	await expect(page.getByText('Tried in place: it worked.')).toBeVisible();
	await page.getByRole('checkbox', { name: 'kill lead' }).check();
	await page
		.getByRole('button', { name: 'Kept: Ignition coil / magneto module, good used' })
		.click();
	await expect(came(page).first()).toContainText('good used');
	// what has its tag has settled: nothing moves under the finger any more
	const tag = await tagOf(came(page).first());
	await page.getByText('Off the machine: 21 in walk-behind mower').click();
	await expect(page.getByRole('link', { name: /^Wheel/ })).toBeVisible();
	await page.goto(`/osiergate/parts?q=${tag}`);
	await expect(page.getByText('without kill lead')).toBeVisible();
	await page.goto(`/osiergate/parts/${tag}`);
	await expect(page.getByText('Missing from the set:')).toBeVisible();
	await expect(page.getByText('worked in place: passed')).toBeVisible();
});

test('two at one donor see each other within a second', async ({ page, browser }) => {
	await signIn(page, 'bench');
	const donor = await donorOnBench(page.request, { ...RIDER, cause: 'valve' });
	const mate = await (await browser.newContext()).newPage();
	await signIn(mate, 'owner');
	await bench(mate, donor, 'coil');
	await bench(page, donor, 'coil');
	// what is before the mate's eyes stays there until the mate has read who was quicker
	await kept(page).click();
	const from = Date.now();
	await expect(mate.getByText('Corwin Paske logged it just now', { exact: false })).toBeVisible();
	expect(Date.now() - from, 'milliseconds until the other saw it').toBeLessThan(3000);
	await expect(kept(mate)).toHaveCount(0);
	await mate.getByRole('button', { name: 'Next part' }).click();
	const next = await shown(mate).innerText();
	await kept(mate)
		.or(mate.getByRole('button', { name: /^Off, to scrap/ }))
		.first()
		.click();
	await expect(came(page).filter({ hasText: next })).toContainText('Idony Ferrack');
	await mate.context().close();
});

test('power lost in the middle: what was answered is there, once', async ({ browserName: _ }, {
	project
}) => {
	const dir = await mkdtemp(join(tmpdir(), 'endplay-bench-'));
	const { baseURL, launchOptions, viewport } = project.use;
	const start = () =>
		chromium.launchPersistentContext(dir, {
			...launchOptions,
			...(baseURL ? { baseURL } : {}),
			...(viewport ? { viewport } : {})
		});
	let phone = await start();
	try {
		let page = await phone.newPage();
		await signIn(page, 'bench');
		const donor = await donorOnBench(page.request, { ...RIDER, cause: 'valve' });
		await bench(page, donor, 'coil');
		await phone.setOffline(true);
		const answered: string[] = [];
		for (let more = 3; more > 0; more--) {
			const name = await shown(page).innerText();
			await (await answerButton(page)).click();
			await expect(shown(page)).not.toHaveText(name);
			answered.push(name);
		}
		await expect(page.getByRole('heading', { name: 'On this phone: 3' })).toBeVisible();
		await expect(page.getByText('No connection', { exact: false })).toBeVisible();
		await phone.close();

		phone = await start();
		page = await phone.newPage();
		await bench(page, donor);
		for (const name of answered)
			await expect(page.getByRole('listitem').filter({ hasText: name })).toHaveCount(1);
		await expect(page.getByRole('heading', { name: /^On this phone/ })).toHaveCount(0);
	} finally {
		await phone.close();
		await rm(dir, { recursive: true, force: true });
	}
});

test('one part after the other: a tap each, a photo two more, nothing typed', async ({ page }) => {
	await signIn(page, 'bench');
	const donor = await donorOnBench(page.request, { ...RIDER, cause: 'retired' });
	await bench(page, donor, 'coil');
	let taps = 0;
	const tap = async (target: Locator) => {
		taps++;
		await target.click();
	};
	const PARTS = 5;
	for (let part = 1; part <= PARTS; part++) {
		const name = await shown(page).innerText();
		await tap(await answerButton(page));
		await expect(shown(page)).not.toHaveText(name);
	}
	await expect(page.getByRole('heading', { name: /^On this phone/ })).toHaveCount(0);
	await expect.poll(() => came(page).count()).toBeGreaterThanOrEqual(3);
	expect(taps).toBe(PARTS);

	await tap(page.locator('summary', { hasText: 'Photo of ' }));
	const camera = page.locator('#bench-photo-camera');
	await expect(camera).toHaveAttribute('capture', 'environment');
	const asked = page.waitForEvent('filechooser');
	await tap(page.locator('label[for=bench-photo-camera]'));
	await (await asked).setFiles('fixtures/photos/label.jpg');
	// with the kept tap this makes three
	expect(taps - PARTS + 1).toBe(3);

	await test.step('the last answer is taken back, a double tap counts once', async () => {
		await bench(page, donor);
		const logged = await came(page).count();
		const name = 'Muffler';
		await bench(page, donor, 'muffler');
		await kept(page)
			.or(page.getByRole('button', { name: /^Off, to scrap/ }))
			.first()
			.dblclick();
		await expect(came(page).filter({ hasText: name })).toHaveCount(1);
		await came(page).filter({ hasText: name }).getByRole('button', { name: /^Undo/ }).click();
		await expect(came(page).filter({ hasText: name })).toHaveCount(0);
		expect(await came(page).count()).toBe(logged);
	});
});

test('without scripts the bench answers by plain forms', async ({ browser }) => {
	const page = await (await browser.newContext({ javaScriptEnabled: false })).newPage();
	await signIn(page, 'bench');
	const donor = await donorOnBench(page.request, { ...RIDER, cause: 'valve' });
	const at = `/osiergate/donors/${donor}/bench`;
	await page.goto(`${at}?kind=coil`);
	await page.getByRole('radio', { name: 'bench test cold' }).check();
	await page.getByRole('button', { name: /, good used$/ }).click();
	await expect(page.getByRole('status').first()).toContainText(
		'Ignition coil / magneto module kept'
	);
	await expect(came(page).first()).toContainText('good used');
	await came(page).first().getByRole('button', { name: /^Undo/ }).click();
	await expect(page.getByRole('status').first()).toContainText(/undone/i);
	await page.goto(`${at}?kind=muffler`);
	await page.getByRole('button', { name: /^Left on/ }).click();
	const left = page.getByRole('region', { name: 'Left on' });
	await expect(left).toContainText('Muffler');
	await left.getByRole('button', { name: 'Take up again: Muffler' }).click();
	await expect(left).toHaveCount(0);
	await page.context().close();
});
