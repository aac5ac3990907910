import { existsSync } from 'node:fs';
import { mkdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { hashOf, readIfThere, root, writeWhole } from './files.js';
import { locked } from './lock.js';
import { lastLines, run } from './processes.js';
import { Stop, step } from './say.js';

const sources = ['src', 'static', 'package-lock.json', 'svelte.config.js', 'vite.config.ts'];
sources.push('tailwind.config.ts', 'tsconfig.json');
const inBuild = join(root, 'build');
const mark = join(inBuild, '.sources');

/**
 * Builds the app unless the build at hand is of these very sources.
 * @param {string} dataDir where the log goes
 */
export function ensureBuild(dataDir) {
	return locked(`build:${root}`, async () => {
		const wanted = hashOf(
			sources.map((name) => join(root, name)),
			(path) => !path.startsWith(join(root, 'src/run')) && !/\.test\.[jt]s$/.test(path)
		);
		if (readIfThere(mark) === wanted && existsSync(join(inBuild, 'index.js'))) return;
		await step('building', () => build(dataDir));
		writeWhole(mark, wanted);
	});
}

/** @param {string} dataDir */
async function build(dataDir) {
	mkdirSync(dataDir, { recursive: true });
	const logFile = join(dataDir, 'build.log');
	const vite = join(root, 'node_modules/vite/bin/vite.js');
	const env = { ...process.env, NODE_ENV: 'production' };
	const { code } = await run(process.execPath, [vite, 'build'], { cwd: root, logFile, env });
	if (code === 0) return;
	const said = lastLines(readFileSync(logFile, 'utf8'));
	throw new Stop(`The build failed. The last lines of ${logFile}:\n${said}`);
}
