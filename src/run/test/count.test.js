import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { countPlaywright, countVitest } from './count.js';

const dir = mkdtempSync(join(tmpdir(), 'endplay-count-'));
afterAll(() => rmSync(dir, { recursive: true, force: true }));

/** @param {unknown} report */
function saved(report) {
	const file = join(dir, 'report.json');
	writeFileSync(file, JSON.stringify(report));
	return file;
}

test('a test file that could not be loaded is a failed test', () => {
	const testResults = [
		{ status: 'failed', assertionResults: [] },
		{ status: 'failed', assertionResults: [{}] },
		{ status: 'passed', assertionResults: [{}, {}] }
	];
	const file = saved({ numPassedTests: 2, numFailedTests: 1, numPendingTests: 1, testResults });
	expect(countVitest(file)).toEqual({ passed: 2, failed: 2, skipped: 1 });
});

test('a journey that passed when tried once more has passed', () => {
	const file = saved({ stats: { expected: 5, unexpected: 1, flaky: 1, skipped: 2 } });
	expect(countPlaywright(file)).toEqual({ passed: 6, failed: 1, skipped: 2 });
});

test('without a report nothing passed', () => {
	expect(countVitest(join(dir, 'none')).passed).toBe(0);
	expect(countPlaywright(join(dir, 'none')).passed).toBe(0);
});
