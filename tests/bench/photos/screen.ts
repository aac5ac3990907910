import { chromium, type Page } from '@playwright/test';
import { readdirSync, readFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { writeFile } from 'node:fs/promises';
import type { Buffer } from 'node:buffer';
import type { Shop } from './shop';

/** The threads that draw pages, of the browser that this bench has started. */
function renderers(): number[] {
	const status = (pid: string, name: string) => readFileSync(`/proc/${pid}/${name}`, 'utf8');
	const parents = new Map<string, string>();
	const found: string[] = [];
	for (const pid of readdirSync('/proc').filter((name) => /^\d+$/.test(name)))
		try {
			parents.set(pid, /PPid:\s*(\d+)/.exec(status(pid, 'status'))?.[1] ?? '');
			if (status(pid, 'cmdline').includes('--type=renderer')) found.push(pid);
		} catch {
			// It has just ended.
		}
	const isOurs = (pid: string): boolean =>
		pid === `${process.pid}` || (parents.has(pid) && isOurs(parents.get(pid) ?? ''));
	return found.filter(isOurs).map(Number);
}

/** Lets every thread of the page work a quarter of the time: a processor four times slower. */
async function slowed<T>(work: () => Promise<T>): Promise<T> {
	const pids = renderers();
	const all = (signal: NodeJS.Signals) => {
		for (const pid of pids)
			try {
				process.kill(pid, signal);
			} catch {
				// It has just ended.
			}
	};
	let on = true;
	const beat = (async () => {
		while (on) {
			all('SIGSTOP');
			await new Promise((done) => setTimeout(done, 12));
			all('SIGCONT');
			await new Promise((done) => setTimeout(done, 4));
		}
	})();
	try {
		return await work();
	} finally {
		on = false;
		await beat;
		all('SIGCONT');
	}
}

/** In the page: from the choice of a photo until its thumbnail is painted, in ms. */
const watchThumbs = () => {
	const found: number[] = [];
	Object.assign(window, { thumbs: found, sent: [] as number[] });
	let chosen = 0;
	addEventListener('change', () => (chosen = performance.now()), { capture: true });
	new MutationObserver((changes) => {
		for (const { addedNodes } of changes)
			for (const node of addedNodes) {
				const image = node instanceof Element ? (node.querySelector('img') ?? node) : null;
				if (!(image instanceof HTMLImageElement) || !image.closest('.tray')) continue;
				const at = chosen;
				// Its small picture may take the place of the photo itself meanwhile.
				const drawn = image.decode().catch(() => image.decode());
				void drawn.then(() => requestAnimationFrame(() => found.push(performance.now() - at)));
			}
	}).observe(document, { childList: true, subtree: true });
	const send = XMLHttpRequest.prototype.send;
	XMLHttpRequest.prototype.send = function (body) {
		const file = body instanceof FormData ? body.get('file') : null;
		const { sent } = window as unknown as { sent: number[] };
		if (file instanceof File) sent.push(file.size);
		send.call(this, body);
	};
};

const seen = (page: Page, what: 'thumbs' | 'sent'): Promise<number[]> =>
	page.evaluate((name) => (window as unknown as Record<string, number[]>)[name] ?? [], what);

async function shoot(page: Page, files: string[]): Promise<number[]> {
	const before = (await seen(page, 'thumbs')).length;
	for (const [at, file] of files.entries()) {
		await page.locator('#photos-camera').setInputFiles(file);
		await page.waitForFunction(
			(count) => (window as unknown as { thumbs: number[] }).thumbs.length >= count,
			before + at + 1
		);
		await page.waitForFunction(() => !document.querySelector('.tray li'));
	}
	return (await seen(page, 'thumbs')).slice(before);
}

/** Photographs with a phone's page: shutter to thumbnail at three speeds, and the bytes of each photo. */
export async function onScreen(base: string, executablePath: string, shop: Shop, photos: Buffer[]) {
	const files = await Promise.all(
		photos.map(async (bytes, at) => {
			const file = join(tmpdir(), `endplay-bench-${process.pid}-${at}.jpg`);
			await writeFile(file, bytes);
			return file;
		})
	);
	const browser = await chromium.launch({ executablePath, args: ['--no-sandbox'] });
	try {
		const context = await browser.newContext({
			...{ viewport: { width: 390, height: 844 }, isMobile: true, hasTouch: true },
			...{ deviceScaleFactor: 2, serviceWorkers: 'block' }
		});
		await context.addCookies(shop.cookies);
		const page = await context.newPage();
		await page.addInitScript(watchThumbs);
		await page.goto(`${base}/osiergate/donors/${shop.number}`);
		await page.locator('#photos-camera').waitFor({ state: 'attached' });
		const [first, ...rest] = files;
		const cold = await shoot(page, [first!]);
		const plain = await shoot(page, rest);
		const cdp = await context.newCDPSession(page);
		await cdp.send('Emulation.setCPUThrottlingRate', { rate: 4 });
		const page4 = await shoot(page, rest);
		await cdp.send('Emulation.setCPUThrottlingRate', { rate: 1 });
		const all4 = await slowed(() => shoot(page, rest));
		return { cold, plain, page4, all4, sent: await seen(page, 'sent') };
	} finally {
		await browser.close();
	}
}
