import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from '@playwright/test';
import { expect, signIn, test } from '../support/browser';
import { controls, stickingOut, structureFaults, tooClose, unfold } from '../support/measure';
import { findShown, pagesOf, phoneScreens } from '../support/screens';

const PHONE = { width: 360, height: 740 };
const STANDARDS = ['wcag2a', 'wcag2aa', 'wcag2aaa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
const CONTRAST = ['color-contrast-enhanced', 'link-in-text-block'];

async function violations(page: Page, theme?: string): Promise<string[]> {
	const axe = new AxeBuilder({ page });
	if (theme) axe.withRules(CONTRAST);
	else axe.withTags([...STANDARDS, 'best-practice']);
	await page.evaluate((name) => {
		if (name) document.documentElement.dataset.theme = name;
		else delete document.documentElement.dataset.theme;
	}, theme);
	const found = await axe.analyze();
	return found.violations.flatMap(({ id, nodes }) =>
		nodes.slice(0, 3).map((node) => `${theme ?? 'light'} ${id}: ${node.html.slice(0, 160)}`)
	);
}

/** Letters twice as large on the narrowest phone; a phone on its side; a desk. */
async function fits(page: Page): Promise<string[]> {
	const sizes = [
		[320, 800, 2],
		[740, 360, 1],
		[1280, 800, 1]
	] as const;
	const found: string[] = [];
	await unfold(page);
	for (const [width, height, letters] of sizes) {
		await page.setViewportSize({ width, height });
		await page.evaluate((times) => {
			document.documentElement.style.fontSize = times === 1 ? '' : `${112.5 * times}%`;
		}, letters);
		found.push(...(await stickingOut(page)).map((said) => `${width} px: ${said}`));
	}
	return found;
}

async function small(page: Page, least: number): Promise<string[]> {
	const all = (await controls(page)).filter(({ inline }) => !inline);
	return all
		.filter(({ width, height }) => Math.min(width, height) < least - 0.5)
		.map((one) => `${one.said}: ${one.width.toFixed(0)} x ${one.height.toFixed(0)}`);
}

async function look(page: Page, path: string): Promise<string[]> {
	await page.setViewportSize(PHONE);
	await page.goto(path);
	await unfold(page);
	const found = [
		...(await violations(page)),
		...(await violations(page, 'dark')),
		...(await violations(page, 'sunlight')),
		...(await structureFaults(page)),
		...(await small(page, 44)).map((said) => `under 44 px: ${said}`),
		...(await fits(page))
	];
	return found.map((said) => `${path} ${said}`);
}

test.use({ isMobile: false, trace: 'off' });

test('pages for everybody are sound, in every theme and size', async ({ page }) => {
	const found: string[] = [];
	for (const path of ['/', '/sign-in', '/sign-up', '/sign-in/sent', '/invite/nobody'])
		found.push(...(await look(page, path)));
	expect(found).toEqual([]);
});

test('every page of a shop is sound, in every theme and size', async ({ page }) => {
	test.setTimeout(240_000);
	await signIn(page, 'owner');
	const found: string[] = [];
	for (const path of [...pagesOf(await findShown(page)), '/choose-shop?all', '/reset'])
		found.push(...(await look(page, path)));
	expect(found).toEqual([]);
});

test('the phone screens fit a gloved thumb', async ({ page }) => {
	await signIn(page, 'owner');
	const found: string[] = [];
	for (const { path, main } of phoneScreens(await findShown(page))) {
		await page.setViewportSize(PHONE);
		await page.goto(path);
		const faults = (await small(page, 64)).map((said) => `under 64 px: ${said}`);
		if (main) {
			const box = await page
				.getByRole('button', { name: new RegExp(`^${main}`) })
				.first()
				.boundingBox();
			if (!box || box.height < 96) faults.push(`${main} is ${box?.height} px high`);
			if (!box || box.y < 370 || box.y + box.height > 740) faults.push(`${main} is at ${box?.y}`);
		} else {
			const box = await page.locator('.lower input.field').boundingBox();
			if (!box || box.y < 370) faults.push(`the field is at ${box?.y}`);
		}
		await unfold(page);
		faults.push(...tooClose(await controls(page), 8).map((said) => `close: ${said}`));
		found.push(...faults.map((said) => `${path} ${said}`));
	}
	expect(found).toEqual([]);
});

test('what has the focus is seen, never under the dock', async ({ page }) => {
	await signIn(page, 'owner');
	const shown = await findShown(page);
	const found: string[] = [];
	const long = [`/osiergate/donors/${shown.whole}`, '/osiergate/worth', '/osiergate/people'];
	for (const path of [...phoneScreens(shown).map((one) => one.path), ...long]) {
		await page.setViewportSize(PHONE);
		await page.goto(path);
		for (let step = 0; step < 40; step++) {
			await page.keyboard.press('Tab');
			const fault = await page.evaluate(() => {
				const at = document.activeElement;
				const dock = document.querySelector('.dock');
				if (!at || at === document.body || !dock || at.closest('.dock, .skip')) return null;
				const box = at.getBoundingClientRect();
				const over = dock.getBoundingClientRect().top;
				const hidden = box.bottom > over + 1 && box.height < over - 64;
				const outlined =
					getComputedStyle(at).outlineStyle !== 'none' ||
					getComputedStyle(at.closest('.box, .tile, .tag') ?? at).outlineStyle !== 'none' ||
					getComputedStyle(at.nextElementSibling ?? at).outlineStyle !== 'none';
				const name = at.getAttribute('aria-label') ?? at.textContent?.trim().slice(0, 40);
				return hidden || box.top < -1
					? `${at.localName} ${name || at.id} at ${box.top.toFixed(0)} to ${box.bottom.toFixed(0)}, dock from ${over.toFixed(0)}`
					: outlined
						? null
						: `${at.localName} ${name || at.id} has no outline`;
			});
			if (fault) found.push(`${path} ${fault}`);
		}
	}
	expect(found).toEqual([]);
});
