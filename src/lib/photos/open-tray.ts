import { here } from './here.svelte';
import { onPhone } from './on-phone';
import { sendPhoto } from './send';
import { shrinkPhoto } from './shrink';
import { Tray } from './tray.svelte';
import type { Account } from './waiting';

/** One page at a time; without TLS a browser has no locks, and two sendings of one key are still kept once. */
const alone = async <T>(name: string, work: () => Promise<T>): Promise<T | null> =>
	navigator.locks
		? await navigator.locks.request(`endplay photo ${name}`, { ifAvailable: true }, (lock) =>
				lock ? work() : null
			)
		: work();

let askedToKeep = false;

/** Without this a phone that runs short may clear away what a page has kept. */
async function keepForGood(): Promise<void> {
	if (askedToKeep) return;
	askedToKeep = true;
	await navigator.storage?.persist?.();
}

/** Opens the tray of this account and keeps it going: on a signal, on coming back, when another page changes it. */
export function openTray(account: Account): () => void {
	const pages = new BroadcastChannel('endplay photos');
	const tray = new Tray(account, {
		phone: onPhone,
		send: sendPhoto,
		shrink: shrinkPhoto,
		now: Date.now,
		chance: Math.random,
		later: (ms, call) => void setTimeout(call, ms),
		link: (picture) => URL.createObjectURL(picture),
		unlink: (link) => link && URL.revokeObjectURL(link),
		alone,
		tell: () => {
			pages.postMessage('changed');
			void keepForGood().catch(() => undefined);
		}
	});
	const wake = () => tray.wake();
	const seen = () => document.visibilityState === 'visible' && tray.wake();
	pages.onmessage = () => void tray.look();
	addEventListener('online', wake);
	document.addEventListener('visibilitychange', seen);
	here.tray = tray;
	void tray.look().then(wake);
	return () => {
		pages.close();
		removeEventListener('online', wake);
		document.removeEventListener('visibilitychange', seen);
		if (here.tray === tray) here.tray = null;
	};
}
