import { ensurePackages } from './packages.js';
import { Stop, inWords } from './say.js';
import { Stopping } from './stopping.js';
import { claim, makePlace } from './test/places.js';

const names = /** @type {const} */ (['check', 'lint', 'pure', 'server', 'e2e']);
/** @typedef {typeof names[number]} Name */
/** @typedef {import('./test/count.js').Count} Count */

const stopping = new Stopping();
stopping.onSignals();

/** @type {Promise<import('./test/places.js').Place> | null} */
let place = null;

try {
	const chosen = choose(process.argv.slice(2));
	await claim();
	await ensurePackages();
	const { passed, failed } = await runAll(chosen);
	await stopping.stop();
	console.log(`\n${passed} passed, ${failed} failed`);
	process.exit(failed > 0 ? 1 : 0);
} catch (error) {
	if (!stopping.begun) console.error(`\n${inWords(error)}`);
	await stopping.stop();
	process.exit(1);
}

/** @param {string[]} asked @returns {readonly Name[]} */
function choose(asked) {
	const unknown = asked.find((name) => !names.some((one) => one === name));
	if (unknown) throw new Stop(`There is no stage "${unknown}". There are: ${names.join(', ')}.`);
	return asked.length > 0 ? names.filter((name) => asked.includes(name)) : names;
}

/** @param {readonly Name[]} chosen */
async function runAll(chosen) {
	const total = { passed: 0, failed: 0 };
	for (const name of chosen) {
		console.log(`${name} ...`);
		const began = performance.now();
		const count = await runStage(name).catch(fault);
		const seconds = ((performance.now() - began) / 1000).toFixed(1);
		if (count.passed + count.failed === 0) {
			console.log(`${name}: no test ran`);
			count.failed = 1;
		}
		const skipped = count.skipped ? `, ${count.skipped} skipped` : '';
		console.log(
			`${name}: ${count.passed} passed, ${count.failed} failed${skipped} (${seconds} s)\n`
		);
		total.passed += count.passed;
		total.failed += count.failed;
	}
	return total;
}

/** @param {Name} name @returns {Promise<Count>} */
async function runStage(name) {
	const stages = await import('./test/stages.js');
	if (name === 'check' || name === 'lint' || name === 'pure') return stages[name]();
	place ??= makePlace(stopping);
	if (name === 'server') return stages.server(await place);
	const { e2e } = await import('./test/e2e.js');
	return e2e(await place, stopping);
}

/** @param {unknown} error @returns {Count} */
function fault(error) {
	console.log(inWords(error));
	return { passed: 0, failed: 1, skipped: 0 };
}
