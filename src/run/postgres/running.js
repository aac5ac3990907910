import { readlinkSync } from 'node:fs';
import { join } from 'node:path';
import { readIfThere } from '../files.js';
import { run } from '../processes.js';

/** @typedef {import('./cluster.js').Cluster} Cluster */

/**
 * The port of the server that runs on exactly this folder, or null. The process must have the folder
 * as its working folder: after a crash its number may belong to any other program.
 * @param {Cluster} cluster
 * @returns {number | null}
 */
export function runningPort(cluster) {
	const [pid, , , port] = (readIfThere(join(cluster.data, 'postmaster.pid')) ?? '').split('\n');
	if (!pid || !port) return null;
	return worksIn(Number(pid)) === cluster.data ? Number(port) : null;
}

/** @param {number} pid */
export function worksIn(pid) {
	try {
		return readlinkSync(`/proc/${pid}/cwd`);
	} catch {
		return null;
	}
}

/** @param {Cluster} cluster @param {number} port */
export async function answers(cluster, port) {
	const args = ['-h', '127.0.0.1', '-p', `${port}`, '-t', '2', '-q'];
	return (await run(join(cluster.bin, 'pg_isready'), args)).code === 0;
}
