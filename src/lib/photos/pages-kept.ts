import type { Account } from './waiting';

/** Pages that were seen, for where there is no signal. The service worker fills it; it is one person's at a time. */
export const PAGES = 'pages';
const WHOSE = '/whose';

/** Nothing that another account has seen stays. */
async function onlyOf(person: string): Promise<void> {
	const pages = await caches.open(PAGES);
	const whose = await (await pages.match(WHOSE))?.text();
	if (whose === person) return;
	await caches.delete(PAGES);
	await (await caches.open(PAGES)).put(WHOSE, new Response(person));
}

/** Has the service worker keep what is needed to photograph without a signal. */
export async function keepPages({ person, shop }: Account): Promise<void> {
	if (!('serviceWorker' in navigator)) return;
	await onlyOf(person);
	await navigator.serviceWorker.register('/service-worker.js');
	const { active } = await navigator.serviceWorker.ready;
	active?.postMessage({ keep: ['photos', 'donors', 'donors/new'].map((at) => `/${shop}/${at}`) });
}
