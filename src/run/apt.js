import { isRoot, onPath, run, lastLines } from './processes.js';
import { Stop } from './say.js';

/**
 * Installs a Debian package as root; says the one command to run otherwise.
 * @param {string} name
 * @param {string} what as it stands in a sentence
 */
export async function installPackage(name, what) {
	const command = `apt-get update && apt-get install -y --no-install-recommends ${name}`;
	if (!onPath('apt-get')) throw new Stop(`${what} is missing. Install it, then start again.`);
	if (!isRoot) {
		throw new Stop(
			`${what} is missing. Run this once, then start again:\n\n  sudo sh -c '${command}'\n`
		);
	}
	const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
	const patience = ['-o', 'DPkg::Lock::Timeout=180', '-o', 'Acquire::Retries=3'];
	await apt(['update', ...patience], env, what);
	const keep = ['-o', 'Dpkg::Options::=--force-confold'];
	await apt(['install', '-y', '--no-install-recommends', ...patience, ...keep, name], env, what);
}

/** @param {string[]} args @param {NodeJS.ProcessEnv} env @param {string} what */
async function apt(args, env, what) {
	const { code, output } = await run('apt-get', args, { env });
	if (code !== 0) {
		throw new Stop(`${what} could not be installed.\n${lastLines(output)}`);
	}
}
