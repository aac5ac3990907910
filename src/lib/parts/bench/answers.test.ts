import { describe, expect, it } from 'vitest';
import { BenchAnswers } from './answers.svelte';
import { memoryStore, type Waiting } from './queue';
import type { Sent } from './send';

const BENCH = { shop: 'osiergate', person: 'ida', donor: 'D3' };
const leave = (kind: string) => ({ what: 'leave' as const, kind });

/** A phone whose signal the test switches. */
function phone(store = memoryStore()) {
	const went: string[] = [];
	const waits: number[] = [];
	let again = () => {};
	let answer: (one: Waiting) => Sent = () => ({ taken: null });
	const answers = new BenchAnswers(BENCH, store, {
		send: async (one) => {
			const sent = answer(one);
			if (!('lost' in sent)) went.push(`${one.answer.kind} ${one.key}`);
			return sent;
		},
		taken: () => {},
		now: () => 1000,
		later: (work, ms) => {
			waits.push(ms);
			again = work;
			return () => {};
		}
	});
	return {
		answers,
		store,
		waits,
		went: () => went.map((one) => one.split(' ')[0]),
		keys: () => went.map((one) => one.split(' ')[1]),
		says: (next: typeof answer) => (answer = next),
		tryAgain: () => again()
	};
}
const settled = () => new Promise((done) => setTimeout(done));
const lost = (): Sent => ({ lost: true });

describe('answers of one phone', () => {
	it('go one after the other in the order they were given, and leave the phone', async () => {
		const { answers, store, went } = phone();
		for (const kind of ['coil', 'stator', 'muffler']) await answers.add('D3', leave(kind), kind);
		await settled();
		expect(went()).toEqual(['coil', 'stator', 'muffler']);
		expect(answers.list).toEqual([]);
		expect(await store.all()).toEqual([]);
	});
	it('without a signal stay on the phone and go later, with growing waits and the same keys', async () => {
		const { answers, store, went, keys, says, tryAgain, waits } = phone();
		says(lost);
		const given = [
			await answers.add('D3', leave('coil'), 'Coil'),
			await answers.add('D3', leave('cam'), 'Cam')
		];
		await settled();
		expect(answers.cut).toBe(true);
		expect((await store.all()).map(({ key }) => key)).toEqual(given);
		for (let tries = 0; tries < 8; tries++) {
			tryAgain();
			await settled();
		}
		expect(waits.every((ms, at) => at === 0 || ms >= waits[at - 1]!)).toBe(true);
		expect(Math.max(...waits)).toBe(30_000);
		says(() => ({ taken: null }));
		tryAgain();
		await settled();
		expect(went()).toEqual(['coil', 'cam']);
		expect(keys()).toEqual(given);
		expect(answers.cut).toBe(false);
	});
	it('refused, one waits for a person and stops no other', async () => {
		const { answers, store, went, says } = phone();
		says(({ answer }) => (answer.kind === 'cam' ? { refused: 'It is gone.' } : { taken: null }));
		for (const kind of ['cam', 'coil']) await answers.add('D3', leave(kind), kind);
		await settled();
		expect(went()).toEqual(['cam', 'coil']);
		expect(answers.list).toMatchObject([{ kindName: 'cam', refused: 'It is gone.' }]);
		says(() => ({ taken: null }));
		await answers.retry(answers.list[0]!.key);
		await settled();
		expect(await store.all()).toEqual([]);
	});
	it('outlive the page; another person, shop or donor never sends them', async () => {
		const store = memoryStore();
		const before = phone(store);
		before.says(lost);
		await before.answers.add('D3', leave('coil'), 'Coil');
		const strange = { key: 'x', answer: leave('cam'), kindName: 'Cam', at: 1 };
		await store.put({ ...strange, ...BENCH, person: 'ben' });
		await store.put({ ...strange, ...BENCH, key: 'y', shop: 'thrennick' });
		const after = phone(store);
		await after.answers.load();
		await settled();
		expect(after.went()).toEqual(['coil']);
		expect((await store.all()).map(({ key }) => key).sort()).toEqual(['x', 'y']);
	});
	it('taken back before it went, it never goes', async () => {
		const { answers, went, says, tryAgain } = phone();
		says(lost);
		const key = await answers.add('D3', leave('coil'), 'Coil');
		await settled();
		await answers.drop(key);
		says(() => ({ taken: null }));
		tryAgain();
		await settled();
		expect(went()).toEqual([]);
		expect(answers.list).toEqual([]);
	});
});
