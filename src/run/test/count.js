import { readIfThere } from '../files.js';

/** @typedef {{ passed: number, failed: number, skipped: number }} Count */

/**
 * What vitest's json report says. A file that could not even be loaded counts as one failed test.
 * @param {string} file
 * @returns {Count}
 */
export function countVitest(file) {
	const report = read(file);
	if (!report) return { passed: 0, failed: 0, skipped: 0 };
	/** @type {{ status: string, assertionResults: unknown[] }[]} */
	const files = report.testResults ?? [];
	const broken = files.filter(
		(one) => one.status === 'failed' && one.assertionResults.length === 0
	).length;
	return {
		passed: report.numPassedTests ?? 0,
		failed: (report.numFailedTests ?? 0) + broken,
		skipped: (report.numPendingTests ?? 0) + (report.numTodoTests ?? 0)
	};
}

/**
 * What playwright's json report says. A journey that passed when tried once more has passed, and that is said.
 * @param {string} file
 * @returns {Count}
 */
export function countPlaywright(file) {
	const report = read(file);
	const { expected = 0, unexpected = 0, flaky = 0, skipped = 0 } = report?.stats ?? {};
	if (flaky) console.log(`${flaky} of the journeys passed only when tried again`);
	return { passed: expected + flaky, failed: unexpected, skipped };
}

/** @param {string} file */
function read(file) {
	const text = readIfThere(file);
	return text ? JSON.parse(text) : null;
}
