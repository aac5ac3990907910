import { mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { root } from '../files.js';
import { tryLock } from '../lock.js';
import { Stop, step } from '../say.js';
import { startServices } from '../services.js';
import { readSettings } from '../settings.js';

export const dataDir = join(root, '.endplay-test');
export const reports = join(dataDir, 'reports');

/** One run at a time: two would share the databases. */
export async function claim() {
	mkdirSync(reports, { recursive: true });
	if (!(await tryLock(`test:${dataDir}`))) {
		throw new Stop('The tests already run in this folder. Wait for them, then try again.');
	}
}

/** @typedef {{ app: Record<string, string>, admin: string, mailboxUrl: string, secrets: import('../secrets.js').Secrets }} Place */

/**
 * Fresh services for the tests, nothing of the last run in them.
 * @param {import('../stopping.js').Stopping} stopping
 * @returns {Promise<Place>}
 */
export async function makePlace(stopping) {
	for (const name of ['store', 'mail'])
		rmSync(join(dataDir, name), { recursive: true, force: true });
	const { settings } = readSettings({});
	const services = await startServices({ dataDir, settings, fast: true, stopping });
	const { env, adminUrl, mailboxUrl, secrets } = services;
	if (!adminUrl || !mailboxUrl) throw new Error('The tests run on services of their own');
	const { ensureRoles } = await import('../roles.js');
	await ensureRoles(adminUrl, secrets);
	await dropOldDatabases(adminUrl);
	return { app: env, admin: adminUrl, mailboxUrl, secrets };
}

/** @param {string} adminUrl */
async function dropOldDatabases(adminUrl) {
	const { connected, dropDatabase } = await import('../roles.js');
	const { rows } = await connected(adminUrl, (client) =>
		client.query(
			"SELECT datname FROM pg_database WHERE NOT datistemplate AND datname <> 'postgres'"
		)
	);
	for (const { datname } of rows) await dropDatabase(adminUrl, datname);
}

/**
 * A fresh, migrated database.
 * @param {Place} place
 * @param {string} name
 */
export function freshDatabase({ admin, secrets }, name) {
	return step(`preparing the database ${name}`, async () => {
		const { dropDatabase, ensureDatabase } = await import('../roles.js');
		const { migrate } = await import('../migrate.js');
		await dropDatabase(admin, name);
		const urls = await ensureDatabase(admin, name, secrets);
		await migrate(urls);
		return urls;
	});
}
