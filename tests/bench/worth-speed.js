// Verdicts for a million parts in one run: rows a second in JavaScript, and what one SQL statement
// of the same arithmetic reaches on PostgreSQL in the same run. npm run bench:verdicts [-- --rows N]
import { runnerImport } from 'vite';
import { join } from 'node:path';
import { root } from '../../src/run/files.js';
import { drawColumns, figuresAt, POLICY } from './worth-speed/columns.js';
import { everyVerdictInSql } from './worth-speed/in-sql.js';

const told = process.argv.indexOf('--rows');
const rows = told > 0 ? Number(process.argv[told + 1]) : 1_000_000;
const columns = drawColumns(rows);
const parts = Array.from({ length: rows }, (_part, row) => figuresAt(columns, row));

const { module: worth } = await runnerImport(join(root, 'src/lib/worth/index.ts'), {
	configFile: false
});
const inJavaScript = best(3, () => everyVerdict(worth));
const inSql = await everyVerdictInSql(columns, rows);

const rate = (/** @type {number} */ seconds) =>
	`${Math.round(rows / seconds).toLocaleString('en')} rows/s`;
console.log(
	`${rows.toLocaleString('en')} parts: used price, gain, timing, break-even, keep-up-to, word`
);
console.log(`JavaScript  ${inJavaScript.seconds.toFixed(2)} s  ${rate(inJavaScript.seconds)}`);
console.log(
	`SQL         ${inSql.seconds.toFixed(2)} s  ${rate(inSql.seconds)}  (filling the table not counted)`
);
console.log(`JavaScript reaches ${(inSql.seconds / inJavaScript.seconds).toFixed(2)} of SQL`);
console.log(`JavaScript answers ${JSON.stringify(inJavaScript.sums)}`);
console.log(`SQL answers        ${JSON.stringify(inSql.sums)}`);
const same = Object.entries(inSql.sums).every(
	([name, sum]) =>
		Math.abs(sum - (inJavaScript.sums[name] ?? NaN)) <= 1e-6 * Math.max(100, Math.abs(sum))
);
console.log(same ? 'Both say the same.' : 'They differ: one of the two is wrong.');
process.exit(same ? 0 : 1);

/** @param {number} turns @param {() => Record<string, number>} work */
function best(turns, work) {
	let seconds = Infinity;
	/** @type {Record<string, number>} */
	let sums = {};
	for (let turn = 0; turn < turns; turn++) {
		const start = performance.now();
		sums = work();
		seconds = Math.min(seconds, (performance.now() - start) / 1000);
	}
	return { seconds, sums };
}

/** @param {typeof import('../../src/lib/worth')} calculator */
function everyVerdict({ usedPrice, gain, verdictWord }) {
	const sums = { used: 0, gain: 0, keep: 0, close: 0, go: 0, now: 0, even: 0, keepUpTo: 0 };
	for (const part of parts) {
		const { usedCents } = usedPrice({
			newCents: part.new_cents,
			copyCents: part.copy_cents || null,
			share: part.share,
			copyCap: POLICY.copyCap,
			stepCents: POLICY.steps,
			leastCents: POLICY.leastCents
		});
		const told = gain({
			usedCents,
			chanceGood: part.chance,
			comeBack: part.come_back,
			comeBackCents: part.refit_cents,
			kitCents: part.kit_cents,
			callsPerYear: part.calls,
			place: part.place,
			moneyRate: POLICY.moneyRate,
			dyingRate: part.dying,
			shelfCents: part.shelf_cents,
			scrapCents: part.scrap_cents,
			labourNow: POLICY.labourNow,
			labour: POLICY.labour,
			minutesNow: 0,
			minutesLater: part.later,
			waiting: part.waiting
		});
		const word = verdictWord({ gainCents: told.gainCents, marginCents: POLICY.marginCents });
		sums.used += usedCents;
		sums.gain += told.gainCents;
		sums[word === 'keep' ? 'keep' : word === 'close call' ? 'close' : 'go'] += 1;
		if (told.timing === 'now') sums.now += 1;
		sums.even += told.breakEvenUsedCents ?? 0;
		sums.keepUpTo += told.keepUpTo ?? 0;
	}
	return sums;
}
