// The JavaScript that each phone screen fetches, gzipped, against its budget of 90 KB.
// Run after a build, against a running shop: E2E_BASE_URL=http://localhost:3000 npm run bench:weight
import { chromium } from '@playwright/test';
import { existsSync } from 'node:fs';
import { gzipSync } from 'node:zlib';

const base = process.env.E2E_BASE_URL ?? 'http://localhost:3000';
const budget = 90 * 1024;
const chrome = [process.env.CHROMIUM_PATH, '/usr/bin/chromium'].find(
	(path) => path && existsSync(path)
);

const browser = await chromium.launch({ executablePath: chrome, args: ['--no-sandbox'] });
const page = await browser.newPage({ viewport: { width: 390, height: 844 } });
await page.goto(`${base}/sign-in`);
await page.getByLabel('E-mail').fill('counter@osiergate.example');
await page.getByLabel('Password').fill('endplay demo shop');
await page.getByRole('button', { name: 'Sign in', exact: true }).click();
await page.waitForURL(/osiergate/);

const part = await firstHref('/osiergate/parts', /\/parts\/[0-9A-Z]{5}$/);
const donor = await firstHref('/osiergate/donors', /\/donors\/D\d+$/i);
const screens = {
	'take in a donor': '/osiergate/donors/new',
	'log a part': `${donor}/log`,
	'find a part': '/osiergate/parts?q=starter',
	'a part: hold': `${part}/hold`,
	'a part: move': `${part}/move`,
	'a part: sell or take back': `${part}/use`
};

let over = 0;
for (const [name, path] of Object.entries(screens)) {
	const bytes = await weigh(path);
	if (bytes > budget) over++;
	console.log(
		`${(bytes / 1024).toFixed(1).padStart(6)} KB  ${((bytes / budget) * 100).toFixed(0).padStart(3)} %  ${name}  ${path}`
	);
}
await browser.close();
console.log(`budget ${budget / 1024} KB of JavaScript gzipped a screen; ${over} over it`);
process.exit(over ? 1 : 0);

/** @param {string} list @param {RegExp} like */
async function firstHref(list, like) {
	await page.goto(base + list);
	const hrefs = await page
		.locator('a')
		.evaluateAll((links) => links.map((link) => link.getAttribute('href') ?? ''));
	const found = hrefs.map((href) => href.split('?')[0] ?? '').find((href) => like.test(href));
	if (!found) throw new Error(`Nothing listed on ${list}`);
	return found;
}

/** A first visit in a fresh cache. @param {string} path */
async function weigh(path) {
	const context = await browser.newContext({
		viewport: { width: 390, height: 844 },
		storageState: await page.context().storageState()
	});
	const fresh = await context.newPage();
	/** @type {Promise<Buffer>[]} */
	const scripts = [];
	fresh.on('response', (response) => {
		if (new URL(response.url()).pathname.endsWith('.js')) scripts.push(response.body());
	});
	await fresh.goto(base + path, { waitUntil: 'networkidle' });
	const bodies = await Promise.all(scripts);
	await context.close();
	return bodies.reduce((sum, body) => sum + gzipSync(body).length, 0);
}
