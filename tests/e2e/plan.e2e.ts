import { expect, ready, signIn, test } from '../support/browser';
import { findShown } from '../support/screens';

test('what to do with a donor, before it is opened', async ({ page }) => {
	await signIn(page, 'owner');
	const { parked } = await findShown(page);
	await page.goto(`/osiergate/donors/${parked}`);
	const choices = page.getByRole('region', { name: 'What to do with it' });
	for (const choice of ['Fix', 'Park', 'Strip', 'Sell whole', 'Scrap'])
		await expect(choices.getByRole('term').filter({ hasText: choice }).first()).toBeVisible();
	await expect(
		choices.getByText(/^\w+ beats \w+.* until .+ (over|under) \$/).first()
	).toBeVisible();

	await choices.getByText('Figures for this engine').click();
	await choices.getByLabel('Price of it dead').fill('5000');
	await choices.getByRole('button', { name: 'Work it out again' }).click();
	await expect(page).toHaveURL(/dead=5000/);
	await expect(choices.getByRole('term').first()).toHaveText('Sell whole');
	await expect(choices.getByText('Counts as $5,000.00')).toBeVisible();

	await choices.getByLabel('Price of it dead').fill('a lot');
	await choices.getByRole('button', { name: 'Work it out again' }).click();
	await expect(choices.getByText(/Enter “Price of it dead” as an amount/)).toBeVisible();
});

test('the pull plan for the minutes at hand, and how it follows the work', async ({ page }) => {
	await signIn(page, 'owner');
	const { bench } = await findShown(page);
	await page.goto(`/osiergate/donors/${bench}`);
	await ready(page);
	const plan = page.getByRole('region', { name: 'Pull plan' });
	const steps = plan.locator('li:not(.under)');
	await plan.getByRole('link', { name: '30 min', exact: true }).click();
	await expect(page).toHaveURL(/minutes=30/);
	await expect(plan.getByText(/^\d+(\.\d)? of 30 min: keep \d+ parts?, then stop\./)).toBeVisible();
	await expect(plan.getByText('Stop here')).toBeVisible();
	await expect(plan.getByRole('link', { name: /^Stays on: / }).first()).toContainText('more min');

	const kept = steps.filter({ hasNot: page.locator('.given-up') }).locator('a');
	const names = await steps.locator('strong').allTextContents();
	expect(names.length).toBeGreaterThan(0);
	const last = names.at(-1)!;
	await kept.filter({ hasText: last }).first().click();
	await expect(page.getByRole('heading', { level: 1 })).toHaveText(last);
	await page.getByRole('radio', { name: 'good used' }).check();
	for (const tick of await page.getByRole('checkbox').all()) await tick.check();
	await page.getByRole('button', { name: /^Kept/ }).click();

	await expect(page.getByRole('status')).toContainText('kept');
	await expect(page).toHaveURL(/minutes=30/);
	await expect(plan.getByRole('link', { name: '30 min', exact: true })).toHaveAttribute(
		'aria-current',
		'true'
	);
	await expect(plan.locator('strong').filter({ hasText: last })).toHaveCount(0);
	await page.getByRole('button', { name: 'Undo' }).click();
	await expect(page.getByRole('status')).toContainText(/undone/i);
});

test('a part that nobody has logged: the verdict, and from which price it pays', async ({
	page
}) => {
	await signIn(page, 'bench');
	await page.goto('/osiergate/people');
	await page.getByRole('link', { name: 'Calculator' }).click();
	await page.getByLabel('Kind of part').selectOption('starter12');
	await page.getByLabel('Why its engine died').selectOption('no-oil');
	await page.getByRole('button', { name: 'Work it out' }).click();
	const verdict = page.getByRole('region', { name: 'Verdict' });
	await expect(verdict).toContainText('needs a price');
	await expect(verdict).toContainText(/Worth keeping if a new one costs over \$\d+/);

	await page.getByLabel('Price of a new one').fill('136');
	await page.getByLabel('Price of a copy').fill('58');
	await page.getByLabel('How many of these there are already').fill('2');
	await page.getByRole('button', { name: 'Work it out' }).click();
	await expect(verdict).toContainText('keep');
	await expect(verdict).toContainText('asked $46');
	await expect(verdict).toContainText(/Keep up to \d+: 2 to hand out/);
	await verdict.getByText('How this is worked out').click();
	await expect(verdict).toContainText('ran without oil');

	await page.goto(page.url().replace('new=136', 'new=much'));
	await expect(page.getByRole('alert').or(page.locator('.ask-error')).first()).toContainText(
		'Enter “Price of a new one” as an amount'
	);
});

test('a reader sees the choices and the plan, and is not asked to do anything', async ({
	page
}) => {
	await signIn(page, 'owner');
	const { parked, bench } = await findShown(page);
	await page.context().clearCookies();
	await signIn(page, 'reader');
	await page.goto(`/osiergate/donors/${parked}`);
	const choices = page.getByRole('region', { name: 'What to do with it' });
	await expect(choices).toBeVisible();
	await expect(choices.getByText('Figures for this engine')).toHaveCount(0);
	await page.goto(`/osiergate/donors/${bench}?minutes=30`);
	const plan = page.getByRole('region', { name: 'Pull plan' });
	await expect(plan).toBeVisible();
	await expect(plan.locator('li a')).toHaveCount(0);
});
