import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres';
import pg from 'pg';
import { env } from '../env';
import { log } from '../log';

export type Db = NodePgDatabase & { $client: pg.Pool };
export type Tx = Parameters<Parameters<NodePgDatabase['transaction']>[0]>[0];

let pool: Db | undefined;

/** Opens a pool on a database; the app's own is `db()`. */
export function openDb(connectionString: string, max: number): Db {
	const client = new pg.Pool({ connectionString, max, idleTimeoutMillis: 30_000 });
	client.on('error', (fault) =>
		log().warn({ fault: fault.message }, 'an idle connection was lost')
	);
	return drizzle(client);
}

export function db(): Db {
	return (pool ??= openDb(env().DATABASE_URL, env().DATABASE_POOL));
}

export async function closeDb(): Promise<void> {
	await pool?.$client.end();
	pool = undefined;
}
