// A shop that lives ten years by the calculator, by rules of thumb, and by one who knows it all.
// npm run bench:worth -- [--seed 1] [--seeds 8] [--years 10] [--sell-off 10] [--only "busy shop"] [--search]
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { createServer } from 'vite';

const { values } = parseArgs({
	options: {
		seed: { type: 'string', default: '1' },
		seeds: { type: 'string', default: '8' },
		years: { type: 'string', default: '10' },
		'sell-off': { type: 'string', default: '10' },
		only: { type: 'string' },
		search: { type: 'boolean', default: false }
	}
});

/** @param {string} name @param {string} text @param {number} least */
function whole(name, text, least) {
	const number = Number(text);
	if (Number.isInteger(number) && number >= least) return number;
	console.error(`--${name}: a whole number from ${least}`);
	process.exit(2);
}

const first = whole('seed', values.seed, 0);
const options = {
	seeds: Array.from({ length: whole('seeds', values.seeds, 1) }, (_, at) => first + at),
	years: whole('years', values.years, 4),
	sellOff: whole('sell-off', values['sell-off'], 0),
	search: values.search,
	...(values.only ? { only: values.only } : {})
};

const root = join(import.meta.dirname, '../..');
const vite = await createServer({
	root,
	configFile: join(root, 'vite.config.ts'),
	server: { middlewareMode: true, hmr: false, ws: false, watch: null },
	appType: 'custom',
	logLevel: 'error',
	optimizeDeps: { noDiscovery: true, include: [] }
});
const { main } = await vite.ssrLoadModule('/tests/bench/worth/main.ts');
const missed = main(options);
await vite.close();
process.exit(missed > 0 ? 1 : 0);
