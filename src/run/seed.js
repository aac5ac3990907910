import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { root } from './files.js';
import { must } from './processes.js';

/**
 * Loads the demo with the app's own code, in a process of its own that has the server's environment.
 * @param {Record<string, string>} env
 */
export async function seed(env) {
	const file = fileURLToPath(import.meta.url);
	const said = await must(process.execPath, [file], { cwd: root, env: { ...process.env, ...env } });
	for (const line of said.split('\n').filter(Boolean)) console.log(`  ${line}`);
}

async function load() {
	const { createServer } = await import('vite');
	const vite = await createServer({
		root,
		cacheDir: join(root, 'node_modules', '.vite-seed'),
		configFile: join(root, 'vite.config.ts'),
		server: { middlewareMode: true, hmr: false, ws: false, watch: null },
		appType: 'custom',
		logLevel: 'error',
		optimizeDeps: { noDiscovery: true, include: [] }
	});
	try {
		const fixtures = await vite.ssrLoadModule('/fixtures/seed.ts');
		await fixtures.seed((/** @type {string} */ line) => console.log(line));
	} finally {
		await vite.close();
	}
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
	// Left open connections must not hold up the start.
	load().then(
		() => process.exit(0),
		(error) => {
			console.error(error);
			process.exit(1);
		}
	);
}
