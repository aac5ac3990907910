import { createHash } from 'node:crypto';
import { chownSync, existsSync, lstatSync, mkdirSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join, resolve } from 'node:path';
import { isRoot, run } from '../processes.js';
import { Stop } from '../say.js';

/** @typedef {{ uid: number, gid: number } | undefined} Account undefined: as who we are */

/**
 * PostgreSQL refuses to run as root, so root starts it as Debian's own account for it.
 * @returns {Promise<Account>}
 */
export async function account() {
	if (!isRoot) return undefined;
	const { code, output } = await run('getent', ['passwd', 'postgres']);
	const [, , uid, gid] = output.split(':');
	if (code !== 0 || !uid || !gid) throw new Stop('There is no account "postgres". Add it.');
	return { uid: Number(uid), gid: Number(gid) };
}

/**
 * Makes the folder for the cluster where that account can reach it.
 * @param {string} wanted
 * @param {Account} who
 * @returns {string}
 */
export function makePlace(wanted, who) {
	const parent = dirname(resolve(wanted));
	mkdirSync(parent, { recursive: true });
	const place = who && !isWalkable(parent, who) ? elsewhere(wanted) : resolve(wanted);
	if (!existsSync(place)) mkdirSync(place, { mode: 0o700 });
	const found = lstatSync(place);
	if (!found.isDirectory() || ![who?.uid, process.getuid?.()].includes(found.uid)) {
		throw new Stop(`${place} belongs to somebody else. Remove it, then start again.`);
	}
	if (who) chownSync(place, who.uid, who.gid);
	return place;
}

/** @param {string} wanted */
export function elsewhere(wanted) {
	const id = createHash('sha256').update(resolve(wanted)).digest('hex').slice(0, 16);
	return join(tmpdir(), `endplay-postgres-${id}`);
}

/** @param {string} folder @param {{ uid: number, gid: number }} who */
function isWalkable(folder, who) {
	for (let path = folder; ; path = dirname(path)) {
		const { uid, gid, mode } = statSync(path);
		const bit = uid === who.uid ? 0o100 : gid === who.gid ? 0o010 : 0o001;
		if ((mode & bit) === 0) return false;
		if (path === dirname(path)) return true;
	}
}
