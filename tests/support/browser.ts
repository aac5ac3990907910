import { expect, test as plain, type Page } from '@playwright/test';
import { BASE, PASSWORD } from './visitor';

/** The cast of the demo by what they do. */
export const CAST = {
	owner: 'owner@osiergate.example',
	bench: 'bench@osiergate.example',
	counter: 'counter@osiergate.example',
	reader: 'reader@osiergate.example',
	neighbour: 'owner@thrennick.example'
} as const;
export type Who = keyof typeof CAST;

interface Fixtures {
	/** What the page is expected to complain of; anything else fails the test. */
	expectedComplaints: RegExp[];
}

/** A test that fails when the page writes an error to the console or throws one. */
export const test = plain.extend<Fixtures>({
	expectedComplaints: [[], { option: true }],
	page: async ({ page, expectedComplaints }, use) => {
		const complaints: string[] = [];
		const note = (said: string) => {
			if (!expectedComplaints.some((expected) => expected.test(said))) complaints.push(said);
		};
		page.on('console', (message) => {
			if (message.type() === 'error') note(`${message.text()} (${message.location().url})`);
		});
		page.on('pageerror', (error) => note(error.stack ?? error.message));
		await use(page);
		expect(complaints, 'errors of the page').toEqual([]);
	}
});

export { expect };

/** Signs in as one of the cast and waits for the shop. */
export async function signIn(page: Page, who: Who): Promise<void> {
	await page.goto('/sign-in');
	await page.getByLabel('E-mail', { exact: true }).first().fill(CAST[who]);
	await page.getByLabel('Password', { exact: true }).fill(PASSWORD);
	await page.getByRole('button', { name: 'Sign in', exact: true }).click();
	await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
}

/** Waits until the scripts of the page have taken over. */
export const ready = (page: Page): Promise<void> =>
	page.waitForLoadState('networkidle').then(() => undefined);

export interface Letter {
	to: string[];
	subject: string;
	text: string;
	links: string[];
}

/** The newest letter to an address, from the mailbox of the tests; waits until one is there. */
export async function letterTo(address: string): Promise<Letter> {
	const mailbox = new URL('/letters.json', process.env.MAILBOX_URL ?? 'http://localhost:8025');
	mailbox.searchParams.set('to', address);
	let newest: Letter | undefined;
	await expect(async () => {
		const letters: Letter[] = await (await fetch(mailbox)).json();
		newest = letters[0];
		expect(newest, `a letter to ${address}`).toBeDefined();
	}).toPass({ timeout: 15_000 });
	return newest!;
}

/** A change of the demo shop by the outside edge, as the one who is signed in. */
export async function change(
	page: Page,
	path: string,
	data: object,
	method: 'post' | 'put' = 'post'
) {
	const headers = { 'idempotency-key': crypto.randomUUID(), origin: BASE };
	const answer = await page.request[method](`/api/osiergate/${path}`, { data, headers });
	expect(answer.ok(), `${path}: ${await answer.text()}`).toBe(true);
	return answer.json();
}
