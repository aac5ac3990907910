import { readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { root } from '../files.js';
import { run } from '../processes.js';
import { urlsOf } from '../roles.js';
import { countPlaywright, countVitest } from './count.js';
import { ensureDecoders } from './decoders.js';
import { freshDatabase, reports } from './places.js';

/** @typedef {import('./count.js').Count} Count */

const longest = 25 * 60 * 1000;

/**
 * Runs one of the npm packages' programs; shows what it said when it failed.
 * @param {string} program
 * @param {string[]} args
 * @param {Record<string, string>} [env]
 * @returns {Promise<boolean>}
 */
async function tool(program, args, env = {}) {
	const logFile = join(reports, `${program}.log`);
	const path = join(root, 'node_modules/.bin', program);
	/** @type {NodeJS.ProcessEnv} */
	const all = { ...process.env, NO_COLOR: '1', ...env };
	delete all.FORCE_COLOR;
	const { code } = await run(path, args, { cwd: root, env: all, logFile, timeout: longest });
	if (code !== 0) console.log(readFileSync(logFile, 'utf8').trimEnd());
	return code === 0;
}

/** @param {boolean} held @returns {Count} */
const asCount = (held) => ({ passed: held ? 1 : 0, failed: held ? 0 : 1, skipped: 0 });

/** The types, in the app and in what runs it. */
export async function check() {
	const args = ['--tsconfig', './tsconfig.json', '--fail-on-warnings'];
	return asCount((await tool('svelte-kit', ['sync'])) && (await tool('svelte-check', args)));
}

/** The rules of the code and its layout. */
export async function lint() {
	const rules = await tool('eslint', ['.']);
	return asCount((await tool('prettier', ['--check', '.'])) && rules);
}

/** @param {string} project @param {Record<string, string>} [env] */
async function vitest(project, env) {
	const report = join(reports, `${project}.json`);
	rmSync(report, { force: true });
	const args = ['run', '--project', project, '--reporter=default', '--reporter=json'];
	const held = await tool('vitest', [...args, `--outputFile.json=${report}`], env);
	return atLeastOne(countVitest(report), held);
}

/** What is wrong without being any test's fault is a failure too. @param {Count} count @param {boolean} held */
const atLeastOne = (count, held) => (held || count.failed > 0 ? count : { ...count, failed: 1 });

export const pure = () => vitest('pure');

/** @param {import('./places.js').Place} place */
export async function server(place) {
	await ensureDecoders();
	const template = 'endplay_template';
	await freshDatabase(place, template);
	const urls = urlsOf(place.admin, 'DATABASE', place.secrets);
	return vitest('server', {
		...place.app,
		ORIGIN: 'http://localhost:3000',
		MAILBOX_URL: place.mailboxUrl,
		TEST_ADMIN_URL: place.admin,
		TEST_DATABASE_TEMPLATE: template,
		TEST_OWNER_URL: urls.owner,
		TEST_APP_URL: urls.app,
		TEST_WORKER_URL: urls.worker,
		DATABASE_URL: urlsOf(place.admin, template, place.secrets).app,
		DATABASE_WORKER_URL: urlsOf(place.admin, template, place.secrets).worker
	});
}

/** @param {Record<string, string>} env */
export async function journeys(env) {
	const report = join(reports, 'e2e.json');
	rmSync(report, { force: true });
	const args = ['test', '--config', 'tests/playwright.config.ts', '--reporter=list,json'];
	const held = await tool('playwright', args, { ...env, PLAYWRIGHT_JSON_OUTPUT_FILE: report });
	return atLeastOne(countPlaywright(report), held);
}
