import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { faults, topLevelFaults } from './support/rooms';

const judge = (file: string, text: string) => faults(new Map([[file, text]]));
const rules = (file: string, text: string) => judge(file, text).map((fault) => fault.rule);
const from = (target: string) => `import { a } from '${target}';\nexport const b = a;`;

const broken: [string, string, string][] = [
	['1 pure rooms', 'src/lib/worth/gain.ts', from('../units')],
	['1 pure rooms', 'src/lib/worth/gain.ts', from('zod')],
	['1 pure rooms', 'src/lib/trade/kind.ts', from('$lib/format')],
	['1 pure rooms', 'src/lib/codes/tag.ts', from('node:crypto')],
	['1 pure rooms', 'src/lib/units/length.ts', 'export const now = () => new Date();'],
	['1 pure rooms', 'src/lib/units/length.ts', 'export const now = () => Date.now();'],
	['1 pure rooms', 'src/lib/worth/money.ts', "new Intl.NumberFormat('en').format(1);"],
	['2 furniture', 'src/lib/ui/Field.svelte', `<script lang="ts">${from('$lib/parts')}</script>`],
	['2 furniture', 'src/lib/format/money.ts', from('$lib/server/env')],
	['2 furniture', 'src/lib/refusal.ts', from('./people/role')],
	['3 front rooms', 'src/lib/bins/address.ts', from('$lib/parts/grade')],
	['3 front rooms', 'src/lib/parts/grade.ts', from('$lib/server/parts')],
	['3 front rooms', 'src/lib/parts/grade.ts', "export type { Row } from '../server/parts/tables';"],
	['3 front rooms', 'src/lib/parts/grade.ts', "type Row = import('$lib/server/parts').Row;"],
	[
		'3 front rooms',
		'src/lib/parts/Tag.svelte',
		"{#await import('$lib/server/parts') then x}{x}{/await}"
	],
	['4 routes', 'src/routes/a/+page.server.ts', from('$lib/server/parts/queries')],
	['4 routes', 'src/routes/a/+page.server.ts', from('$lib/server/db')],
	['4 routes', 'src/routes/a/+page.server.ts', from('$lib/server/parts/tables')],
	['4 routes', 'src/routes/a/+server.ts', "export const go = () => import('$lib/server/jobs');"],
	['4 routes', 'src/routes/a/+page.svelte', `<script>${from('$lib/server/parts')}</script>`],
	['5 back rooms', 'src/lib/server/bins/move.ts', from('$lib/server/parts')],
	['5 back rooms', 'src/lib/server/bins/move.ts', from('$lib/server/parts/queries')],
	['5 back rooms', 'src/lib/server/parts/pull.ts', from('$lib/server/donors/queries')],
	['5 back rooms', 'src/lib/server/parts/pull.ts', from('$lib/ui/Toast')],
	['5 back rooms', 'src/lib/server/parts/pull.ts', from('../../../routes/a')],
	['6 plumbing', 'src/lib/server/db/pool.ts', from('$lib/server/people')],
	['6 plumbing', 'src/lib/server/context.ts', from('$lib/parts/words')],
	['6 environment', 'src/lib/server/mail/send.ts', 'export const url = process.env.SMTP_URL;'],
	['6 environment', 'src/lib/server/mail/send.ts', "export const url = process.env['SMTP_URL'];"],
	['6 environment', 'src/lib/server/log.ts', 'const { env } = process; export const a = env.A;'],
	['6 environment', 'src/lib/server/log.ts', "export const a = globalThis.process['env'].A;"],
	['6 environment', 'src/lib/server/log.ts', from('node:process')],
	['6 environment', 'src/routes/a/+page.server.ts', from('$env/dynamic/private')],
	['6 environment', 'src/lib/parts/grade.ts', 'export const dev = import.meta.env.DEV;'],
	['6 jobs', 'src/lib/server/people/invite.ts', from('./jobs')],
	['6 jobs', 'src/lib/server/queue/run.ts', from('../jobs')],
	['6 jobs', 'src/lib/server/queue/run.ts', from('$lib/server/photos/jobs')],
	[
		'7 ledger',
		'src/lib/server/ledger/post.ts',
		`${from('$lib/server/parts/tables')} db.update(a);`
	],
	[
		'7 ledger',
		'src/lib/server/ledger/post.ts',
		"import * as t from '../parts/tables'; db.insert(t.part);"
	],
	['map', 'src/lib/gadgets/one.ts', 'export const a = 1;'],
	['map', 'src/lib/server/parts/helpers.ts', 'export const a = 1;']
];

const sound: [string, string][] = [
	['src/lib/worth/gain.ts', from('./values')],
	['src/lib/worth/gain.test.ts', from('fast-check')],
	['src/lib/format/size.ts', from('$lib/units')],
	['src/lib/ui/Field.svelte', `<script lang="ts">${from('@lucide/svelte')}</script>`],
	['src/lib/parts/grade.ts', `${from('$lib/bins/address')}\n${from('$lib/worth')}\n${from('zod')}`],
	['src/lib/server/parts/pull.ts', from('$lib/server/donors')],
	['src/lib/server/parts/queries.ts', from('$lib/server/donors/tables')],
	['src/lib/server/parts/pull.ts', `${from('./tables')}\n${from('$lib/parts/grade')}`],
	['src/lib/server/find/queries.ts', from('$lib/server/wants/tables')],
	['src/lib/server/ledger/queries.ts', `${from('$lib/server/parts/tables')} db.select(a);`],
	['src/lib/server/ledger/queries.ts', 'const seen = new Set(); seen.delete(seen);'],
	['src/lib/server/env.ts', 'export const port = process.env.PORT;'],
	['src/run/start.js', 'export const port = process.env.PORT;'],
	['src/lib/server/jobs.ts', from('$lib/server/photos/jobs')],
	['src/hooks.server.ts', from('$lib/server/jobs')],
	['src/routes/a/+page.server.ts', `${from('$lib/server/parts')}\n${from('$lib/server/http')}`],
	['src/routes/a/+page.svelte', `<script>${from('$lib/parts/input')}</script><p>import</p>`],
	[
		'src/lib/parts/say.ts',
		"// import { a } from '$lib/server/db'\nexport const process = { env: 1 };"
	]
];

describe('the checker', () => {
	it.each(broken)('finds a breach of %s in %s: %s', (rule, file, text) => {
		expect(rules(file, text)).toContain(rule);
	});

	it.each(sound)('lets %s be', (file, text) => {
		expect(judge(file, text)).toEqual([]);
	});

	it('finds what does not belong at the top', () => {
		expect(topLevelFaults(['src/a.ts', '.gitignore', 'README.md', 'api/openapi.json'])).toEqual([]);
		expect(topLevelFaults(['scripts/x.js', 'notes.md', 'src/a.ts'])).toEqual([
			...['notes.md', 'scripts']
		]);
	});
});

describe('this house', () => {
	const listed = execFileSync(
		'git',
		['ls-files', '--cached', '--others', '--exclude-standard', '-z'],
		{ encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 }
	);
	const paths = listed.split('\0').filter((file) => file !== '' && existsSync(file));
	const isCode = (file: string) => /^src\/.*\.(ts|js|svelte)$/.test(file);

	it('keeps its import rules', () => {
		const files = new Map(
			paths.filter(isCode).map((file) => [file, readFileSync(file, 'utf8')] as const)
		);
		expect(files.size).toBeGreaterThan(30);
		expect(faults(files)).toEqual([]);
	});

	it('has nothing at the top that does not belong there', () => {
		expect(topLevelFaults(paths)).toEqual([]);
	});
});
