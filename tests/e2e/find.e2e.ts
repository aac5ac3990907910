import { expect, ready, signIn, test } from '../support/browser';

test('the answer comes while typing, the address keeps step, and a stale answer never covers a newer', async ({
	page
}) => {
	await signIn(page, 'counter');
	await page.goto('/osiergate/parts');
	const field = page.getByRole('searchbox');
	await expect(page.getByRole('heading', { level: 2 }).first()).toBeVisible();

	let held: (() => void) | undefined;
	await page.route(/\/api\/osiergate\/parts\?q=coil/, async (route) => {
		await new Promise<void>((go) => (held = go));
		await route.continue().catch(() => undefined);
	});
	await field.fill('coil');
	await expect.poll(() => held !== undefined).toBe(true);
	await field.fill('carberator');
	const first = page.getByRole('heading', { level: 2 }).first();
	await expect(first).toContainText('Carburetor');
	held?.();
	await page.waitForTimeout(300);
	await expect(first).toContainText('Carburetor');
	await expect(page).toHaveURL(/\?q=carberator$/);
	await expect(field).toHaveValue('carberator');

	await page.reload();
	await expect(first).toContainText('Carburetor');
	await field.fill('xyzzy');
	await expect(page.getByText('No such part here.')).toBeVisible();
	await expect(page.getByRole('heading', { name: 'Nearest on the shelf' })).toBeVisible();
});

test('filters are links with counts, kept in the address', async ({ page }) => {
	await signIn(page, 'reader');
	await page.goto('/osiergate/parts?q=k3');
	await ready(page);
	await page.getByText('Narrow down').click();
	const chip = page.getByRole('navigation', { name: 'By grade' }).getByRole('link').first();
	const count = Number(/(\d+)\s*$/.exec(await chip.innerText())?.[1]);
	await chip.click();
	await expect(page).toHaveURL(/grade=/);
	await expect(page.getByRole('status').filter({ hasText: /part/ })).toContainText(`${count} part`);
	await page.goto('/osiergate/parts?q=recoil&grade=core');
	await expect(page.getByText('No such part with these filters.')).toBeVisible();
	await page.getByRole('link', { name: 'Look without filters' }).click();
	await expect(page.getByRole('heading', { level: 2 }).first()).toContainText('Recoil');
});

test.describe('without scripts', () => {
	test.use({ javaScriptEnabled: false });

	test('the form asks and the page answers', async ({ page }) => {
		await signIn(page, 'counter');
		await page.goto('/osiergate/parts');
		await page.getByRole('searchbox').fill('recoyl');
		await page.getByRole('button', { name: 'Find' }).click();
		await expect(page).toHaveURL(/q=recoyl/);
		await expect(page.getByRole('heading', { level: 2 }).first()).toContainText('Recoil');
		await page.goto('/osiergate/parts?q=k3&view=table');
		await expect(page.getByRole('table', { name: 'Parts found' })).toBeVisible();
	});
});
