import { expect, test } from 'vitest';
import { page } from './listing.js';
import { bucket, itemsOf, trialStore } from './trial.js';

const store = trialStore();

/** @typedef {import('minio').BucketItem} Item */

test('more than 1000 keys are listed in full and in order', async () => {
	const names = Array.from({ length: 1205 }, (_, at) => `many/${String(at).padStart(5, '0')}`);
	for (let at = 0; at < names.length; at += 40) {
		const some = names.slice(at, at + 40);
		await Promise.all(some.map((name) => store.client().putObject(bucket, name, 'x')));
	}
	for (const list of [
		store.client().listObjectsV2(bucket, 'many/', true),
		store.client().listObjects(bucket, 'many/', true)
	]) {
		/** @type {Item[]} */
		const found = await itemsOf(list);
		expect(found.map((item) => item.name)).toEqual(names);
	}
}, 20_000);

test('folders are folded unless all is asked for', async () => {
	for (const name of ['f/a', 'f/b/1', 'f/b/2', 'f/c'])
		await store.client().putObject(bucket, name, 'x');
	/** @type {Item[]} */
	const found = await itemsOf(store.client().listObjectsV2(bucket, 'f/'));
	expect(found.map((item) => item.name ?? item.prefix).sort()).toEqual(['f/a', 'f/b/', 'f/c']);
});

test('pages go on where the last one ended, folders too', () => {
	const all = ['a', 'b/1', 'b/2', 'c', 'd/1'];
	const wanted = { prefix: '', delimiter: '/', most: 2 };
	const first = page(all, { ...wanted, after: '' });
	expect(first).toEqual({ keys: ['a'], folders: ['b/'], next: 'b/' });
	const second = page(all, { ...wanted, after: first.next ?? '' });
	expect(second).toEqual({ keys: ['c'], folders: ['d/'], next: null });
});
