// How fast and how good the search is: 200 shops, a million parts, asked through HTTP, in SQL, and of others.
// npm run bench:find -- [--parts 1000000] [--shops 200] [--fresh] [--seed 3] [--no-peers]
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { createServer } from 'vite';
import { ensureBuild } from '../../src/run/build.js';
import { connected, dropDatabase, ensureDatabase, ensureRoles } from '../../src/run/roles.js';
import { freePort } from '../../src/run/ports.js';
import { migrate } from '../../src/run/migrate.js';
import { startServer } from '../../src/run/server.js';
import { startServices } from '../../src/run/services.js';
import { readSettings } from '../../src/run/settings.js';
import { Stopping } from '../../src/run/stopping.js';

const { values } = parseArgs({
	options: {
		parts: { type: 'string', default: '1000000' },
		shops: { type: 'string', default: '200' },
		seed: { type: 'string', default: '3' },
		fresh: { type: 'boolean', default: false },
		'no-peers': { type: 'boolean', default: false }
	}
});
const root = join(import.meta.dirname, '../..');
const dataDir = join(root, '.endplay-bench');
const stopping = new Stopping();
stopping.onSignals();

/** As a host of 4 GB is set. */
const TUNED = {
	shared_buffers: '1GB',
	effective_cache_size: '3GB',
	work_mem: '32MB',
	maintenance_work_mem: '512MB',
	max_wal_size: '4GB',
	random_page_cost: '1.1',
	jit: 'off',
	max_parallel_workers_per_gather: '0'
};

async function services() {
	const { settings } = readSettings({});
	const open = () => startServices({ dataDir, settings, fast: true, stopping });
	const first = await open();
	const { rows } = await connected(first.adminUrl ?? '', (client) =>
		client.query("select setting from pg_settings where name = 'shared_buffers'")
	);
	if (rows[0].setting === '131072') return first;
	await connected(first.adminUrl ?? '', async (client) => {
		for (const [name, value] of Object.entries(TUNED))
			await client.query(`alter system set ${name} = '${value}'`);
	});
	await stopping.stop();
	return open();
}

const vite = await createServer({
	root,
	configFile: join(root, 'vite.config.ts'),
	server: { middlewareMode: true, hmr: false, ws: false, watch: null },
	appType: 'custom',
	logLevel: 'error',
	optimizeDeps: { noDiscovery: true, include: [] }
});
let missed;
try {
	const { env, adminUrl, secrets } = await services();
	if (!adminUrl || !secrets) throw new Error('The bench runs on services of its own');
	await ensureRoles(adminUrl, secrets);
	const name = `endplay_find_${values.shops}_${values.parts}`;
	if (values.fresh) await dropDatabase(adminUrl, name);
	const urls = await ensureDatabase(adminUrl, name, secrets);
	await migrate(urls);
	await ensureBuild(dataDir);
	const port = await freePort();
	const { prepare, run } = await vite.ssrLoadModule('/tests/bench/find/main.ts');
	const options = {
		parts: Number(values.parts),
		shops: Number(values.shops),
		seed: Number(values.seed),
		peers: !values['no-peers'],
		urls
	};
	const world = await prepare(options);
	const app = {
		...env,
		...{ PORT: `${port}`, HOST: '127.0.0.1', ORIGIN: `http://localhost:${port}` },
		...{ DATABASE_URL: urls.app, DATABASE_WORKER_URL: urls.worker, SHUTDOWN_TIMEOUT: '2' }
	};
	const server = await startServer({ env: app, port, quiet: true, stopping });
	missed = await run(options, world, `http://127.0.0.1:${port}`);
	await server.stop();
} finally {
	await vite.close();
	await stopping.stop();
}
process.exit(missed > 0 ? 1 : 0);
