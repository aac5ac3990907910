import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { pathToFileURL } from 'node:url';
import { root } from './files.js';
import { Stop } from './say.js';

/**
 * @typedef {object} Server
 * @property {(now?: boolean) => Promise<void>} stop
 * @property {Promise<number>} ended its exit code
 */

/**
 * Runs the built server, or the one that reloads, and waits until it is ready.
 * @param {{ env: Record<string, string>, port: number, reload?: boolean, quiet?: boolean, stopping: import('./stopping.js').Stopping }} options
 * @returns {Promise<Server>}
 */
export async function startServer({ env, port, reload = false, quiet = false, stopping }) {
	const follow = pathToFileURL(join(root, 'src/run/follow.js')).href;
	const vite = [
		'node_modules/vite/bin/vite.js',
		'dev',
		'--port',
		`${port}`,
		'--strictPort',
		'--host'
	];
	const program = reload ? [...vite, env.HOST ?? '127.0.0.1'] : ['build/index.js'];
	const out = quiet ? 'ignore' : 'inherit';
	const child = spawn(process.execPath, ['--import', follow, ...program], {
		cwd: root,
		env: environment(env, reload),
		stdio: ['ignore', out, 'inherit', 'ipc'],
		// A group of its own: a Ctrl-C reaches it through us, in the right order.
		detached: true
	});
	/** @type {Promise<number>} */
	const ended = new Promise((done) => {
		child.once('exit', (code) => done(code ?? 1));
		child.once('error', () => done(1));
	});
	const stop = async (now = false) => {
		if (child.exitCode !== null || child.signalCode !== null) return;
		child.kill(now ? 'SIGKILL' : 'SIGTERM');
		const late = setTimeout(() => child.kill('SIGKILL'), 8000);
		await ended;
		clearTimeout(late);
	};
	stopping.add(stop);
	await ready(port, ended);
	return { stop, ended };
}

/** @param {Record<string, string>} env @param {boolean} reload */
function environment(env, reload) {
	/** @type {NodeJS.ProcessEnv} */
	const all = { ...process.env, ...(reload ? {} : { NODE_ENV: 'production' }), ...env };
	// The server never acts as the owner of the tables.
	delete all.DATABASE_ADMIN_URL;
	return all;
}

/** @param {number} port @param {Promise<number>} ended */
async function ready(port, ended) {
	let alive = true;
	ended.then(() => (alive = false));
	let said = 'It did not answer.';
	for (const until = Date.now() + 60_000; Date.now() < until && alive; await wait(100)) {
		try {
			const signal = AbortSignal.timeout(20_000);
			const answer = await fetch(`http://127.0.0.1:${port}/readyz`, { signal });
			said = await answer.text();
			if (answer.ok) return;
		} catch {
			// Not listening yet.
		}
	}
	throw new Stop(alive ? `The server is not ready: ${said}` : 'The server ended while starting.');
}
