import pg from 'pg';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startPostgres } from '../../../src/run/postgres/index.js';
import { COLUMNS } from './columns.js';
import { STATEMENT } from './statement.js';

/** The best of three, and what it says. @param {Float64Array[]} columns @param {number} rows */
export async function everyVerdictInSql(columns, rows) {
	const given = process.env.DATABASE_ADMIN_URL;
	const dir = given ? null : mkdtempSync(join(tmpdir(), 'verdicts-'));
	const own = dir ? await startPostgres({ dir, fast: true, log: console.log }) : null;
	const client = new pg.Client(given ?? own?.adminUrl);
	await client.connect();
	try {
		const list = COLUMNS.map((name) => `${name} float8`).join(', ');
		await client.query(`create temporary table part_figures (${list})`);
		for (let from = 0; from < rows; from += 50_000) {
			const slices = columns.map((column) => `{${column.subarray(from, from + 50_000).join()}}`);
			const arrays = COLUMNS.map((_name, at) => `$${at + 1}::float8[]`).join(', ');
			await client.query(`insert into part_figures select * from unnest(${arrays})`, slices);
		}
		await client.query('analyze part_figures');
		let seconds = Infinity;
		/** @type {Record<string, number>} */
		let sums = {};
		for (let turn = 0; turn < 3; turn++) {
			const start = performance.now();
			const {
				rows: [answer]
			} = await client.query(STATEMENT);
			seconds = Math.min(seconds, (performance.now() - start) / 1000);
			sums = Object.fromEntries(Object.entries(answer).map(([name, sum]) => [name, Number(sum)]));
		}
		return { seconds, sums };
	} finally {
		await client.end();
		await own?.stop(true);
		if (dir) rmSync(dir, { recursive: true, force: true });
	}
}
