/// <reference no-default-lib="true"/>
/// <reference lib="esnext" />
/// <reference lib="webworker" />
/// <reference types="@sveltejs/kit" />
import { build, files, version } from '$service-worker';

const worker = globalThis.self as unknown as ServiceWorkerGlobalScope;

const SHELL = `shell-${version}`;
const PAGES = 'pages';
const MOST_PAGES = 80;
const PATIENCE_MS = 6000;

/** Scripts, styles and type come at once; what is larger (readers of codes and text) when it is first used. */
const SMALL = [...build, ...files].filter((path) => /\.(js|css|woff2|svg)$/.test(path));
const OURS = new Set([...build, ...files]);

/** What can be photographed: the pages of donors and parts, and the one of waiting photos. Never a picture. */
const KEPT = /^\/[^/]+\/(donors|parts|photos)(\/|$)/;

async function install(): Promise<void> {
	const shell = await caches.open(SHELL);
	await shell.addAll(SMALL);
	await worker.skipWaiting();
}

/** The shell before this one stays, for pages that are still open with it. */
async function activate(): Promise<void> {
	const shells = (await caches.keys()).filter(
		(name) => name.startsWith('shell-') && name !== SHELL
	);
	await Promise.all(shells.slice(0, -1).map((name) => caches.delete(name)));
	await worker.clients.claim();
}

async function fromShell(request: Request): Promise<Response> {
	const kept = await caches.match(request.url);
	if (kept) return kept;
	const answer = await fetch(request);
	if (answer.status === 200) await (await caches.open(SHELL)).put(request.url, answer.clone());
	return answer;
}

async function keep(url: string, answer: Response): Promise<void> {
	const pages = await caches.open(PAGES);
	await pages.delete(url);
	await pages.put(url, answer);
	const old = (await pages.keys()).slice(1, -MOST_PAGES);
	await Promise.all(old.map((request) => pages.delete(request)));
}

const late = () =>
	new Promise<never>((_, fail) => setTimeout(() => fail(new Error('no answer')), PATIENCE_MS));

/** The page as it was last seen; without one, on to the place where anything can be photographed. */
async function fromPages(url: URL, isPage: boolean): Promise<Response> {
	const pages = await caches.open(PAGES);
	const kept = (await pages.match(url)) ?? (await pages.match(url, { ignoreSearch: true }));
	if (kept) return kept;
	const photos = new URL(`/${url.pathname.split('/')[1]}/photos`, url);
	return isPage && (await pages.match(photos)) ? Response.redirect(photos, 302) : Response.error();
}

async function fresh(event: FetchEvent, url: URL): Promise<Response> {
	try {
		const kept = await (await caches.open(PAGES)).match(url);
		const asked = fetch(event.request);
		const answer = await (kept ? Promise.race([asked, late()]) : asked);
		const page = answer.type === 'basic' && answer.status === 200 && !answer.redirected;
		if (page) event.waitUntil(keep(url.href, answer.clone()));
		return answer;
	} catch {
		return fromPages(url, event.request.mode === 'navigate');
	}
}

/** Whoever comes next finds nothing of the one before. */
const forget = () => caches.delete(PAGES);

/** Pages that are needed where there is no signal are fetched before anybody asks. */
async function keepPages(paths: string[]): Promise<void> {
	const pages = await caches.open(PAGES);
	for (const path of paths) {
		if (await pages.match(path)) continue;
		const answer = await fetch(path, { redirect: 'error' });
		if (answer.ok) await pages.put(path, answer);
	}
}

const isData = (url: URL) => url.pathname.endsWith('/__data.json');

worker.addEventListener('install', (event) => event.waitUntil(install()));
worker.addEventListener('activate', (event) => event.waitUntil(activate()));
worker.addEventListener('message', (event) => {
	const { keep: paths } = event.data ?? {};
	if (Array.isArray(paths)) event.waitUntil(keepPages(paths).catch(() => undefined));
});
worker.addEventListener('fetch', (event) => {
	const { request } = event;
	const url = new URL(request.url);
	if (url.origin !== location.origin) return;
	if (/^\/(sign-in|sign-out)\b/.test(url.pathname)) event.waitUntil(forget());
	if (request.method !== 'GET') return;
	if (OURS.has(url.pathname)) event.respondWith(fromShell(request));
	else if (KEPT.test(url.pathname) && (request.mode === 'navigate' || isData(url)))
		event.respondWith(fresh(event, url));
});
