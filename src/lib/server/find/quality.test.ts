import pg from 'pg';
import { FindQuery } from '$lib/find/input';
import { beforeAll, expect, it } from 'vitest';
import { makeCatalogue } from '../../../../tests/bench/find/catalogue';
import { loadWorld } from '../../../../tests/bench/find/load';
import { makeQuestions } from '../../../../tests/bench/find/questions';
import { scored, type ClassScore } from '../../../../tests/bench/find/score';
import { makeWorld, shopSizes } from '../../../../tests/bench/find/world';
import { testDb } from '../../../../tests/support/shops';
import { findParts } from './index';

const NOW = new Date('2026-12-01T12:00:00Z');
let scores: ClassScore[];

/** The worker's own database, as the superuser: a world is copied in, not worked in. */
function asAdmin(): pg.Client {
	const url = new URL(process.env.TEST_ADMIN_URL!);
	url.pathname = new URL(process.env.DATABASE_URL!).pathname;
	return new pg.Client({ connectionString: url.href });
}

beforeAll(async () => {
	const db = await testDb();
	const client = asAdmin();
	await client.connect();
	const world = makeWorld(makeCatalogue(11), shopSizes(10, 20_000), 12);
	const tagged = await loadWorld(client, world, () => undefined);
	await client.end();
	const ctx = { db, shopId: 1, memberId: 1, role: 'owner' as const, now: NOW };
	const questions = makeQuestions(world, world.shops[0]!, tagged[0]!, 13);
	const answers = [];
	for (const { typed } of questions) {
		const { items, total } = await findParts(ctx, FindQuery.parse({ q: typed }));
		answers.push([{ ids: items.map(({ id }) => id), total, ms: 0 }]);
	}
	scores = scored(questions, answers);
}, 120_000);

it('finds what is there among 20,000 parts, in every way that it is asked for', () => {
	const all = scores.find((score) => score.class === 'ALL')!;
	expect(scores.length).toBeGreaterThan(20);
	expect(all.count).toBeGreaterThan(450);
	expect(all.recall).toBeGreaterThanOrEqual(0.99);
	expect(all.mrr).toBeGreaterThanOrEqual(0.98);
});

it('leaves no way of asking behind', () => {
	const weak = scores.filter(({ recall }) => recall < 0.95);
	expect(weak.map(({ class: name, recall }) => `${name} ${recall}`)).toEqual([]);
});
