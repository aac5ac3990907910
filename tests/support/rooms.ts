import { readSource, type Source } from './imports';
import { AREAS, placeOf, type Back, type Place } from './places';

export interface Fault {
	file: string;
	rule: string;
	said: string;
}

type Rule = (source: Source, from: Place) => string[];

const isLeftOf = (left: string, right: string) => AREAS.indexOf(left) < AREAS.indexOf(right);
const isServer = (target: string) => /^src\/lib\/server(\/|$)/.test(target);

/** The imports for which `allowed` says no. */
function refused(source: Source, allowed: (to: Place, target: string) => boolean): string[] {
	return source.imports.filter((target) => !allowed(placeOf(target), target));
}

// 1. worth, trade, codes, units import only themselves; no dates, no formatting
const pure: Rule = (source, from) => {
	if (from.what !== 'pure') return [];
	const foreign = refused(source, (to) => to.what === 'pure' && to.room === from.room);
	const impure = ['Date', 'Date.now', 'Intl', 'Math.random', 'console', 'process', 'fetch'];
	return [...foreign, ...impure.filter((name) => source.names.has(name))];
};

// 2. ui, format, refusal import only each other and the pure rooms
const furniture: Rule = (source, from) => {
	if (!['ui', 'format', 'refusal'].includes(from.what)) return [];
	const known = ['ui', 'format', 'refusal', 'pure', 'package'];
	return refused(source, (to) => known.includes(to.what));
};

// 3. front rooms import those and front rooms to their left
const front: Rule = (source, from) => {
	if (from.what !== 'front') return [];
	const known = ['ui', 'format', 'refusal', 'pure', 'package'];
	return refused(source, (to) => {
		if (to.what !== 'front') return known.includes(to.what);
		return to.room === from.room || isLeftOf(to.room, from.room);
	});
};

// 4. routes enter a back room by its door only; never db, tables or jobs
const routes: Rule = (source, from) => {
	if (from.what !== 'route') return [];
	// what the browser gets never names the server side
	const onClient = /(\.svelte(\.ts)?|\/\+(page|layout)\.ts)$/.test(source.file);
	const shut = ['db', 'queue'];
	return refused(source, (to, target) => {
		if (onClient && isServer(target)) return false;
		if (to.what === 'back') return to.inside === '';
		if (to.what === 'plumbing') return !shut.includes(to.room);
		return to.what !== 'jobs' && to.what !== 'hooks' && to.what !== 'unknown';
	});
};

function backMayUse(from: Back, to: Place): boolean {
	if (to.what !== 'back') {
		return ['plumbing', 'front', 'format', 'refusal', 'pure', 'package'].includes(to.what);
	}
	if (to.room === from.room) return true;
	const isTables = to.inside === 'tables' || to.inside.startsWith('tables/');
	return isTables || (isLeftOf(to.room, from.room) && to.inside === '');
}

// 5. back rooms import plumbing, front rooms (not ui), doors to their left, any tables (for joins and keys)
const back: Rule = (source, from) => {
	if (from.what !== 'back') return [];
	return refused(source, (to) => backMayUse(from, to));
};

// 6a. plumbing imports no area
const plumbing: Rule = (source, from) => {
	if (from.what !== 'plumbing') return [];
	const known = ['plumbing', 'format', 'refusal', 'pure', 'package'];
	// The context carries the member's role, which is people's word.
	const isRole = (to: Place) =>
		source.file === 'src/lib/server/context.ts' && to.what === 'front' && to.room === 'people';
	return refused(source, (to) => known.includes(to.what) || isRole(to));
};

// 6b. only env.ts reads the environment; what runs before the app does so for itself
const environment: Rule = (source, from) => {
	if (from.what === 'run' || source.file === 'src/lib/server/env.ts') return [];
	const kit = source.imports.filter((target) => /^\$env\/|^(node:)?process$/.test(target));
	const reads = /^(globalThis\.)?(process\.env|import\.meta\.env)(\.|$)/;
	return [...kit, ...[...source.names].filter((name) => reads.test(name))];
};

// 6c. only jobs.ts collects jobs, and only hooks.server.ts brings it in
const jobs: Rule = (source, from) => {
	const collected = refused(source, (to) => {
		if (to.what === 'jobs') return from.what === 'hooks';
		if (to.what !== 'back' || to.inside !== 'jobs') return true;
		return from.what === 'jobs';
	});
	if (from.what !== 'jobs') return collected;
	const known = ['plumbing', 'back', 'refusal', 'pure', 'package'];
	return [...collected, ...refused(source, (to) => known.includes(to.what))];
};

// 7. ledger reads every table and writes none
const ledger: Rule = (source, from) => {
	if (from.what !== 'back' || from.room !== 'ledger') return [];
	return source.written.filter((name) => {
		const to = placeOf(source.brought.get(name) ?? '');
		return to.what === 'back' && to.inside.startsWith('tables');
	});
};

// the map: every file of lib is in a room that the house has, under a name that says something
const map: Rule = (source, from) => {
	const name = source.file.split('/').at(-1)?.split('.')[0] ?? '';
	const empty = ['utils', 'helpers', 'misc', 'common', 'types', 'constants'].includes(name);
	const homeless = from.what === 'unknown' && /^src\/lib\/./.test(source.file);
	return [...(empty ? [`a file called ${name}`] : []), ...(homeless ? ['no such room'] : [])];
};

const RULES: Record<string, Rule> = {
	...{ '1 pure rooms': pure, '2 furniture': furniture, '3 front rooms': front, '4 routes': routes },
	...{ '5 back rooms': back, '6 plumbing': plumbing, '6 environment': environment },
	...{ '6 jobs': jobs, '7 ledger': ledger, map }
};

const isTest = (file: string) => /\.(test|e2e)\.(ts|js)$/.test(file);

/** The breaches of the import rules in these files (path from the top -> source), tests left out. */
export function faults(files: ReadonlyMap<string, string>): Fault[] {
	return [...files]
		.filter(([file]) => file.startsWith('src/') && !isTest(file))
		.flatMap(([file, text]) => {
			const source = readSource(file, text);
			const from = placeOf(file);
			return Object.entries(RULES).flatMap(([rule, judge]) =>
				judge(source, from).map((said) => ({ file, rule, said }))
			);
		});
}

const TOP = new Set([
	...['README.md', 'DEVELOPERS.md', 'package.json', 'package-lock.json', 'svelte.config.js'],
	...['vite.config.ts', 'tailwind.config.ts', 'drizzle.config.ts', 'tsconfig.json'],
	...['eslint.config.js', 'migrations', 'fixtures', 'static', 'tests', 'src', 'api']
]);

/** What stands at the top of the repository and should not; dotfiles may. */
export function topLevelFaults(paths: readonly string[]): string[] {
	const tops = new Set(paths.map((each) => each.split('/')[0] ?? ''));
	return [...tops].filter((top) => top !== '' && !top.startsWith('.') && !TOP.has(top)).sort();
}
