import pg from 'pg';

/** @typedef {{ ownerPassword: string, appPassword: string, workerPassword: string }} Passwords */
/** @typedef {{ admin: string, owner: string, app: string, worker: string }} Urls */

/**
 * @template T
 * @param {string} url
 * @param {(client: pg.Client) => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function connected(url, work) {
	const client = new pg.Client({ connectionString: url, connectionTimeoutMillis: 10_000 });
	await client.connect();
	try {
		return await work(client);
	} finally {
		await client.end();
	}
}

/**
 * The four roles: who owns the tables, who the app is, who runs the jobs, whose search functions run.
 * @param {string} adminUrl as a superuser
 * @param {Passwords} passwords
 */
export function ensureRoles(adminUrl, passwords) {
	return connected(adminUrl, async (client) => {
		await client.query('BEGIN');
		await client.query("SELECT pg_advisory_xact_lock(hashtext('endplay roles'))");
		const plain = 'NOSUPERUSER NOCREATEDB NOCREATEROLE';
		await ensure(client, 'endplay_owner', `LOGIN BYPASSRLS ${plain}`, passwords.ownerPassword);
		await ensure(client, 'endplay_app', `LOGIN NOBYPASSRLS ${plain}`, passwords.appPassword);
		await ensure(client, 'endplay_worker', `LOGIN NOBYPASSRLS ${plain}`, passwords.workerPassword);
		await ensure(client, 'endplay_search', `NOLOGIN NOBYPASSRLS ${plain}`);
		// The owner hands functions over to endplay_search and adds jobs to the worker's tables.
		await client.query('GRANT endplay_search, endplay_worker TO endplay_owner');
		await client.query('COMMIT');
	});
}

/** @param {pg.Client} client @param {string} name @param {string} rights @param {string} [password] */
async function ensure(client, name, rights, password) {
	const { rowCount } = await client.query('SELECT FROM pg_roles WHERE rolname = $1', [name]);
	if (!rowCount) await client.query(`CREATE ROLE ${name}`);
	const secret = password ? ` PASSWORD ${client.escapeLiteral(password)}` : '';
	await client.query(`ALTER ROLE ${name} ${rights}${secret}`);
}

/**
 * A database that the owner may fill with tables and the trusted extensions.
 * @param {string} adminUrl as a superuser
 * @param {string} name
 * @param {Passwords} passwords
 * @returns {Promise<Urls>}
 */
export async function ensureDatabase(adminUrl, name, passwords) {
	const database = pg.escapeIdentifier(name);
	await connected(adminUrl, async (client) => {
		await client.query("SELECT pg_advisory_lock(hashtext('endplay databases'))");
		const { rowCount } = await client.query('SELECT FROM pg_database WHERE datname = $1', [name]);
		if (!rowCount) await client.query(`CREATE DATABASE ${database} OWNER endplay_owner`);
		await client.query(`REVOKE ALL ON DATABASE ${database} FROM PUBLIC`);
		await client.query(`GRANT CONNECT ON DATABASE ${database} TO endplay_app, endplay_worker`);
		// The job queue makes its own tables, in a schema of its own.
		await client.query(`GRANT CREATE ON DATABASE ${database} TO endplay_worker`);
	});
	return urlsOf(adminUrl, name, passwords);
}

/** @param {string} adminUrl @param {string} name */
export function dropDatabase(adminUrl, name) {
	return connected(adminUrl, (client) =>
		client.query(`DROP DATABASE IF EXISTS ${pg.escapeIdentifier(name)} WITH (FORCE)`)
	);
}

/**
 * @param {string} adminUrl
 * @param {string} name
 * @param {Passwords} passwords
 * @returns {Urls}
 */
export function urlsOf(adminUrl, name, passwords) {
	/** @param {string} [user] @param {string} [password] */
	const as = (user, password = '') => {
		const url = new URL(adminUrl);
		url.pathname = `/${name}`;
		if (user) Object.assign(url, { username: user, password });
		return url.href;
	};
	return {
		admin: as(),
		owner: as('endplay_owner', passwords.ownerPassword),
		app: as('endplay_app', passwords.appPassword),
		worker: as('endplay_worker', passwords.workerPassword)
	};
}
