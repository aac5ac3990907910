// What a photo costs: through the whole shop against bare sharp, on the phone, in lists, and in bad faith.
// npm run bench:photos -- [--at http://localhost:3000] [--photos 12] [--rounds 3]
// Without --at it runs a shop of its own. With it: a built shop with the demo in it.
import { fork } from 'node:child_process';
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { parseArgs } from 'node:util';
import { createServer } from 'vite';
import { ensureBuild } from '../../src/run/build.js';
import { migrate } from '../../src/run/migrate.js';
import { freePort } from '../../src/run/ports.js';
import { connected, dropDatabase, ensureDatabase, ensureRoles } from '../../src/run/roles.js';
import { seed } from '../../src/run/seed.js';
import { startServer } from '../../src/run/server.js';
import { startServices } from '../../src/run/services.js';
import { readSettings } from '../../src/run/settings.js';
import { Stopping } from '../../src/run/stopping.js';
import { ensureChromium } from '../../src/run/test/chromium.js';

const { values } = parseArgs({
	options: {
		at: { type: 'string' },
		shop: { type: 'boolean', default: false },
		photos: { type: 'string', default: '12' },
		rounds: { type: 'string', default: '3' }
	}
});
const root = join(import.meta.dirname, '../..');
const dataDir = join(root, '.endplay-bench', 'photos');
const stopping = new Stopping();
stopping.onSignals();

/** A fresh shop with the demo in it. Returns how it is reached. */
async function ownShop() {
	mkdirSync(dataDir, { recursive: true });
	const { settings } = readSettings({});
	const { env, adminUrl, secrets } = await startServices({
		...{ dataDir, settings, fast: true, stopping }
	});
	if (!adminUrl) throw new Error('The bench runs on services of its own');
	await ensureRoles(adminUrl, secrets);
	await dropDatabase(adminUrl, 'endplay_photos');
	const urls = await ensureDatabase(adminUrl, 'endplay_photos', secrets);
	await migrate(urls);
	await ensureBuild(dataDir);
	const port = await freePort();
	const app = {
		...env,
		...{ PORT: `${port}`, HOST: '127.0.0.1', ORIGIN: `http://localhost:${port}` },
		...{ DATABASE_URL: urls.app, DATABASE_WORKER_URL: urls.worker },
		...{ SHUTDOWN_TIMEOUT: '2', BODY_SIZE_LIMIT: '30M' }
	};
	await seed(app);
	await startServer({ env: app, port, quiet: true, stopping });
	await calm(urls.worker);
	return { ...env, E2E_BASE_URL: app.ORIGIN };
}

/** Loading the demo leaves work in the queue, which would be measured along. @param {string} worker */
async function calm(worker) {
	/** @param {import('pg').Client} client */
	const left = (client) => client.query('SELECT count(*)::int AS jobs FROM graphile_worker.jobs');
	for (const until = Date.now() + 120_000; Date.now() < until; await wait(500)) {
		const { rows } = await connected(worker, left);
		if (rows[0].jobs === 0) return;
	}
	throw new Error('The queue does not come to rest');
}

/** The shop in a process of its own, store and all: what it takes must not be the bench's to give. */
function shopBeside() {
	const child = fork(import.meta.filename, ['--shop'], {
		stdio: ['ignore', 'inherit', 'inherit', 'ipc']
	});
	stopping.add(async () => {
		if (child.connected) child.disconnect();
		await new Promise((done) => child.once('exit', done));
	});
	return new Promise((done, fail) => {
		child.once('message', done);
		child.once('exit', (code) => fail(new Error(`The shop ended (${code}).`)));
	});
}

if (values.shop) {
	process.once('disconnect', () => void stopping.stop().then(() => process.exit(0)));
	process.send?.(await ownShop());
	await new Promise(() => {});
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
	Object.assign(process.env, values.at ? { E2E_BASE_URL: values.at } : await shopBeside());
	const base = process.env.E2E_BASE_URL;
	const { run } = await vite.ssrLoadModule('/tests/bench/photos/main.ts');
	missed = await run({
		base,
		chromium: await ensureChromium(),
		photos: Number(values.photos),
		rounds: Number(values.rounds)
	});
} finally {
	await vite.close();
	await stopping.stop();
}
process.exit(missed > 0 ? 1 : 0);
