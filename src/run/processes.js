import { spawn } from 'node:child_process';
import { closeSync, existsSync, openSync, readFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { Stop } from './say.js';

/**
 * @typedef {object} RunOptions
 * @property {string} [cwd]
 * @property {NodeJS.ProcessEnv} [env]
 * @property {number} [uid]
 * @property {number} [gid]
 * @property {string} [logFile] where the output goes; without it the output is returned
 * @property {number} [timeout] in milliseconds, then it is ended
 */

/** @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set();

/** Ends the commands that still run, when nobody waits for them any more. */
export function endRunning() {
	for (const child of running) child.kill('SIGTERM');
}

/**
 * @param {string} command
 * @param {string[]} args
 * @param {RunOptions} [options]
 * @returns {Promise<{ code: number, output: string }>}
 */
export function run(command, args, { logFile, ...options } = {}) {
	const log = logFile ? openSync(logFile, 'w') : undefined;
	const out = log ?? 'pipe';
	return new Promise((resolve, reject) => {
		const child = spawn(command, args, { ...options, stdio: ['ignore', out, out] });
		running.add(child);
		child.once('close', () => running.delete(child));
		let output = '';
		child.stdout?.on('data', (chunk) => (output += chunk));
		child.stderr?.on('data', (chunk) => (output += chunk));
		child.once('error', reject);
		// 'exit', not 'close': a server left running would keep the pipes open.
		child.once('exit', (code) => setImmediate(() => resolve({ code: code ?? 1, output })));
	}).finally(() => log !== undefined && closeSync(log));
}

/**
 * The same, for a command that has to succeed.
 * @param {string} command
 * @param {string[]} args
 * @param {RunOptions} [options]
 * @returns {Promise<string>}
 */
export async function must(command, args, options) {
	const { code, output } = await run(command, args, options);
	if (code === 0) return output;
	const said = options?.logFile ? readFileSync(options.logFile, 'utf8') : output;
	throw new Stop(`${command} ${args[0] ?? ''} failed (${code}).\n${lastLines(said)}`);
}

/** @param {string} text @param {number} [count] */
export function lastLines(text, count = 30) {
	return text.trimEnd().split('\n').slice(-count).join('\n');
}

/**
 * @param {string} name
 * @returns {string | null}
 */
export function onPath(name) {
	const folders = (process.env.PATH ?? '').split(delimiter).filter(Boolean);
	return folders.map((folder) => join(folder, name)).find((path) => existsSync(path)) ?? null;
}

/** @param {number} pid */
export function isAlive(pid) {
	try {
		process.kill(pid, 0);
		return true;
	} catch (error) {
		return /** @type {NodeJS.ErrnoException} */ (error).code === 'EPERM';
	}
}

export const isRoot = process.getuid?.() === 0;
