import { appendFileSync, existsSync, mkdirSync, readdirSync, realpathSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { installPackage } from '../apt.js';
import { readIfThere } from '../files.js';
import { isRoot, onPath, run } from '../processes.js';
import { Stop } from '../say.js';

const library = '/usr/lib/postgresql';
const oldest = 15;

/**
 * The folder of PostgreSQL's programs; installs PostgreSQL when there is none.
 * @param {string | null} wanted the major version of a cluster that is already there
 * @param {import('../say.js').Log} log
 * @returns {Promise<string>}
 */
export async function findBinaries(wanted, log) {
	const found = await look(wanted);
	if (found) return found;
	if (wanted && (await look(null))) {
		throw new Stop(`The data is of PostgreSQL ${wanted}, which is not installed. Install it.`);
	}
	if (isRoot) keepDebianFromMakingACluster();
	log('PostgreSQL is missing: installing it from Debian');
	await installPackage('postgresql', 'PostgreSQL 15 or later');
	const installed = await look(wanted);
	if (!installed) throw new Stop('PostgreSQL 15 or later is not to be had from this Debian.');
	return installed;
}

/** @param {string | null} wanted */
async function look(wanted) {
	const candidates = [...fromLibrary(), ...(await fromPath())]
		.filter(({ version }) => (wanted ? version === Number(wanted) : version >= oldest))
		.filter(({ folder }) =>
			['initdb', 'pg_ctl', 'postgres'].every((p) => existsSync(join(folder, p)))
		)
		.sort((a, b) => b.version - a.version);
	return candidates[0]?.folder ?? null;
}

function fromLibrary() {
	if (!existsSync(library)) return [];
	return readdirSync(library)
		.filter((name) => /^\d+$/.test(name))
		.map((name) => ({ version: Number(name), folder: join(library, name, 'bin') }));
}

async function fromPath() {
	const program = onPath('postgres');
	if (!program) return [];
	const { output } = await run(program, ['--version']);
	const version = Number(/\(PostgreSQL\) (\d+)/.exec(output)?.[1] ?? 0);
	return [{ version, folder: dirname(realpathSync(program)) }];
}

function keepDebianFromMakingACluster() {
	const file = '/etc/postgresql-common/createcluster.conf';
	if (/^\s*create_main_cluster/m.test(readIfThere(file) ?? '')) return;
	mkdirSync(dirname(file), { recursive: true });
	appendFileSync(file, '\ncreate_main_cluster = false\n');
}
