import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate as applyMigrations } from 'drizzle-orm/node-postgres/migrator';
import { Logger, runMigrations } from 'graphile-worker';
import { root } from './files.js';
import { connected } from './roles.js';
import { Stop } from './say.js';

const folder = join(root, 'migrations');
const roles = ['endplay_owner', 'endplay_app', 'endplay_worker', 'endplay_search'];
const quiet = new Logger(() => () => {});

/**
 * Brings the job queue's tables and ours up to date. The queue comes first: ours add jobs to it.
 * @param {{ owner: string, worker: string }} urls `owner` may be any role that may become endplay_owner
 */
export async function migrate({ owner, worker }) {
	await connected(owner, async (client) => {
		await client.query("SELECT pg_advisory_lock(hashtext('endplay migrations'))");
		await checkRoles(client);
		await runMigrations({ connectionString: worker, logger: quiet });
		const { rows } = await client.query('SELECT current_user AS role');
		if (rows[0].role !== 'endplay_owner') await client.query('SET ROLE endplay_owner');
		if (!existsSync(join(folder, 'meta', '_journal.json'))) return;
		await applyMigrations(drizzle(client), { migrationsFolder: folder });
	});
}

/** @param {import('pg').Client} client */
async function checkRoles(client) {
	const { rows } = await client.query('SELECT rolname FROM pg_roles WHERE rolname = ANY($1)', [
		roles
	]);
	const found = rows.map((row) => row.rolname);
	const missing = roles.filter((role) => !found.includes(role));
	if (missing.length === 0) return;
	throw new Stop(
		`The database lacks ${missing.join(', ')}. Run this once as its superuser, then start again:\n
  CREATE ROLE endplay_owner LOGIN BYPASSRLS PASSWORD '...';
  CREATE ROLE endplay_app LOGIN PASSWORD '...';
  CREATE ROLE endplay_worker LOGIN PASSWORD '...';
  CREATE ROLE endplay_search NOLOGIN;
  GRANT endplay_search, endplay_worker TO endplay_owner;
  ALTER DATABASE ... OWNER TO endplay_owner;
  GRANT CONNECT, CREATE ON DATABASE ... TO endplay_worker;
  GRANT CONNECT ON DATABASE ... TO endplay_app;\n`
	);
}
