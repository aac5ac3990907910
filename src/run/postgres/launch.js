import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { readIfThere } from '../files.js';
import { rememberedPort } from '../ports.js';
import { lastLines, run } from '../processes.js';
import { Stop } from '../say.js';
import { asAccount } from './cluster.js';
import { answers, runningPort, worksIn } from './running.js';

/** @typedef {import('./cluster.js').Cluster} Cluster */

/** @param {Cluster} cluster @returns {Promise<number>} the port */
export async function launch(cluster) {
	const log = join(cluster.place, 'log');
	for (let attempt = 0; attempt < 10; attempt++) {
		dropForeignPidFile(cluster);
		const port = await rememberedPort(join(cluster.place, 'port'));
		const args = [
			'start',
			'-D',
			cluster.data,
			'-l',
			log,
			'-w',
			'-t',
			'60',
			'-o',
			options(cluster, port)
		];
		const { code } = await run(join(cluster.bin, 'pg_ctl'), args, asAccount(cluster));
		if (code === 0 && (await answers(cluster, port))) return port;
		// Remains of a killed server need a moment to go.
		await wait(300);
		const running = runningPort(cluster);
		if (running && (await answers(cluster, running))) return running;
	}
	throw new Stop(`PostgreSQL does not start.\n${lastLines(readIfThere(log) ?? '', 8)}`);
}

/** @param {Cluster} cluster */
function dropForeignPidFile(cluster) {
	const file = join(cluster.data, 'postmaster.pid');
	const pid = Number((readIfThere(file) ?? '').split('\n')[0]);
	const folder = pid > 0 ? worksIn(pid) : null;
	if (folder !== null && folder !== cluster.data) rmSync(file, { force: true });
}

/** @param {Cluster} cluster @param {number} port */
function options({ fast }, port) {
	const set = ['listen_addresses=127.0.0.1', `port=${port}`, "unix_socket_directories=''"];
	set.push('max_connections=200', 'password_encryption=scram-sha-256', 'timezone=UTC');
	if (fast) set.push('fsync=off', 'synchronous_commit=off', 'full_page_writes=off');
	return set.map((setting) => `-c ${setting}`).join(' ');
}
