import { dev } from '$app/environment';
import { openTray } from './open-tray';
import { keepPages } from './pages-kept';
import type { Account } from './waiting';

/** What the shell sets going for photos once its page has woken up: the tray, and pages for where there is no signal. */
export function wake(account: Account): () => void {
	if (!dev) void keepPages(account).catch(() => undefined);
	return openTray(account);
}
