import { randomBytes } from 'node:crypto';
import { chownSync, existsSync, readdirSync, renameSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { readIfThere, writeWhole } from '../files.js';
import { must } from '../processes.js';

/**
 * @typedef {object} Cluster
 * @property {string} bin
 * @property {string} place the folder that holds all of it
 * @property {string} data PostgreSQL's own folder in there
 * @property {import('./place.js').Account} who
 * @property {boolean} fast
 */

export const superuser = 'endplay_admin';

/** @param {Cluster} cluster */
export function asAccount({ place, who }) {
	return {
		cwd: place,
		...who,
		env: { ...process.env, HOME: place, LC_ALL: 'C.UTF-8', LANG: 'C.UTF-8' }
	};
}

/** @param {Cluster} cluster @returns {string} */
export function readPassword({ place, who }) {
	const file = join(place, 'password');
	if (!readIfThere(file)) writeWhole(file, randomBytes(24).toString('base64url'), 0o600);
	if (who) chownSync(file, who.uid, who.gid);
	return readIfThere(file) ?? '';
}

/**
 * Makes the cluster under another name and renames it when whole, so that half of one never counts.
 * @param {Cluster} cluster
 */
export async function initialise(cluster) {
	for (const name of readdirSync(cluster.place)) {
		if (name.startsWith('half-'))
			rmSync(join(cluster.place, name), { recursive: true, force: true, maxRetries: 5 });
	}
	if (existsSync(cluster.data)) return;
	const half = join(cluster.place, `half-${randomBytes(4).toString('hex')}`);
	const args = ['-D', half, '-U', superuser, '--encoding=UTF8', '--locale=C.UTF-8'];
	args.push('--auth=scram-sha-256', `--pwfile=${join(cluster.place, 'password')}`);
	if (cluster.fast) args.push('--no-sync');
	await must(join(cluster.bin, 'initdb'), args, asAccount(cluster));
	renameSync(half, cluster.data);
}
