import type { Tray } from './tray.svelte';

/** The tray of whoever is signed in on this page; null until the page has woken up. */
class Here {
	tray = $state.raw<Tray | null>(null);
}

export const here = new Here();
