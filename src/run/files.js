import { createHash, randomBytes } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = join(dirname(fileURLToPath(import.meta.url)), '../..');

/**
 * Writes a whole file or nothing: a reader never sees half of it.
 * @param {string} path
 * @param {string | Buffer} content
 * @param {number} [mode]
 */
export function writeWhole(path, content, mode = 0o644) {
	const draft = `${path}.${randomBytes(6).toString('hex')}.new`;
	try {
		writeFileSync(draft, content, { mode, flush: true });
		renameSync(draft, path);
	} catch (error) {
		rmSync(draft, { force: true });
		throw error;
	}
}

/**
 * @param {string} path
 * @returns {string | null} the trimmed text, or null when there is no such file
 */
export function readIfThere(path) {
	return existsSync(path) ? readFileSync(path, 'utf8').trim() : null;
}

/**
 * One hash over the names and contents of files and folders.
 * @param {string[]} paths
 * @param {(path: string) => boolean} [wanted]
 * @returns {string}
 */
export function hashOf(paths, wanted = () => true) {
	const hash = createHash('sha256');
	for (const path of paths.flatMap(filesUnder).filter(wanted).sort()) {
		hash
			.update(`${relative(root, path)}\0`)
			.update(readFileSync(path))
			.update('\0');
	}
	return hash.digest('hex');
}

/**
 * @param {string} path
 * @returns {string[]}
 */
function filesUnder(path) {
	if (!existsSync(path)) return [];
	try {
		const entries = readdirSync(path, { withFileTypes: true, recursive: true });
		return entries
			.filter((entry) => entry.isFile())
			.map((entry) => join(entry.parentPath, entry.name));
	} catch (error) {
		if (/** @type {NodeJS.ErrnoException} */ (error).code === 'ENOTDIR') return [path];
		throw error;
	}
}
