import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { hashOf, readIfThere, root, writeWhole } from './files.js';
import { locked } from './lock.js';
import { must } from './processes.js';
import { step } from './say.js';

/** Installs the npm packages when they are missing or other ones are asked for. */
export function ensurePackages() {
	const mark = join(root, 'node_modules', '.endplay-lock');
	const wanted = hashOf([join(root, 'package-lock.json')]);
	return locked(`packages:${root}`, async () => {
		if (readIfThere(mark) === wanted) return;
		if (!existsSync(mark) && installedHere()) return writeWhole(mark, wanted);
		await step('installing npm packages', () =>
			must('npm', ['ci', '--include=dev'], { cwd: root })
		);
		writeWhole(mark, wanted);
	});
}

/** Whether somebody has run npm by hand since the lock file changed: npm keeps a copy of what it did. */
function installedHere() {
	const [asked, done] = ['package-lock.json', 'node_modules/.package-lock.json'].map((name) =>
		packagesIn(join(root, name))
	);
	return asked !== null && asked === done;
}

/** @param {string} file */
function packagesIn(file) {
	const text = readIfThere(file);
	if (!text) return null;
	/** @type {Record<string, { version?: string, optional?: boolean }>} */
	const packages = JSON.parse(text).packages ?? {};
	const versions = Object.entries(packages)
		.filter(([name, { optional }]) => name !== '' && !optional)
		.map(([name, { version }]) => `${name}@${version}`);
	return versions.sort().join();
}
