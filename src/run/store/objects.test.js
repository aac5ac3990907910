import { randomBytes } from 'node:crypto';
import { readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { CopyConditions } from 'minio';
import { expect, test } from 'vitest';
import { bucket, bytesOf, itemsOf, trialStore } from './trial.js';

const store = trialStore();

/** @typedef {import('minio').BucketItem} Item */

test('put, get and head give back bytes, type, metadata and etag', async () => {
	const bytes = randomBytes(70_000);
	const sent = { 'Content-Type': 'image/webp', 'X-Amz-Meta-Donor': 'D12' };
	const { etag } = await store
		.client()
		.putObject(bucket, 'd12/box.webp', bytes, bytes.length, sent);
	expect(
		(await bytesOf(await store.client().getObject(bucket, 'd12/box.webp'))).equals(bytes)
	).toBe(true);
	const found = await store.client().statObject(bucket, 'd12/box.webp');
	expect(found).toMatchObject({ size: 70_000, etag });
	expect(found.metaData).toMatchObject({ 'content-type': 'image/webp', donor: 'D12' });
});

test('an empty object is an object', async () => {
	await store.client().putObject(bucket, 'empty', Buffer.alloc(0));
	expect(await bytesOf(await store.client().getObject(bucket, 'empty'))).toHaveLength(0);
});

test('a range gives a piece, one outside is refused', async () => {
	await store.client().putObject(bucket, 'range', Buffer.from('0123456789'));
	const piece = await store.client().getPartialObject(bucket, 'range', 3, 4);
	expect((await bytesOf(piece)).toString()).toBe('3456');
	const end = await store.client().getPartialObject(bucket, 'range', 7);
	expect((await bytesOf(end)).toString()).toBe('789');
	await expect(store.client().getPartialObject(bucket, 'range', 10)).rejects.toMatchObject({
		code: 'InvalidRange'
	});
});

test('a missing key says so, to get and to head', async () => {
	await expect(store.client().statObject(bucket, 'gone')).rejects.toMatchObject({
		code: 'NotFound'
	});
	await expect(store.client().getObject(bucket, 'gone')).rejects.toMatchObject({
		code: 'NoSuchKey'
	});
});

test('delete removes; deleting again is no error; many go at once', async () => {
	const keys = ['x/1', 'x/2 &<>"', 'x/3'];
	for (const key of keys) await store.client().putObject(bucket, key, 'x');
	await store.client().removeObject(bucket, 'x/1');
	await store.client().removeObject(bucket, 'x/1');
	await store.client().removeObjects(bucket, keys);
	expect(await itemsOf(store.client().listObjectsV2(bucket, 'x/', true))).toEqual([]);
});

test.each([
	'a+b c',
	'../../etc/passwd',
	'a/../b',
	'ä/ß €',
	'per%cent',
	'q?x=1&y',
	'50%2B',
	"it's (1)*!"
])('the key %j is a key like any other, copied too', async (key) => {
	await store.client().putObject(bucket, key, Buffer.from(key), undefined, { 'X-Amz-Meta-A': 'b' });
	expect((await bytesOf(await store.client().getObject(bucket, key))).toString()).toBe(key);
	const copy = `copy of ${key}`;
	await store.client().copyObject(bucket, copy, `/${bucket}/${key}`, new CopyConditions());
	expect((await bytesOf(await store.client().getObject(bucket, copy))).toString()).toBe(key);
	expect((await store.client().statObject(bucket, copy)).metaData).toMatchObject({ a: 'b' });
	/** @type {Item[]} */
	const listed = await itemsOf(store.client().listObjectsV2(bucket, key, true));
	expect(listed.map((item) => item.name)).toContain(key);
});

test('no key becomes a file name', () => {
	const names = readdirSync(store.dir, { recursive: true }).map(String);
	expect(names.filter((name) => /passwd|per|box/.test(name))).toEqual([]);
	const pointers = readdirSync(join(store.dir, 'buckets', bucket));
	expect(pointers.every((name) => /^[0-9a-f]{64}\.json$/.test(name))).toBe(true);
});

test('overwriting leaves one copy of the bytes and lets a reader finish with the old ones', async () => {
	const [old, fresh] = [randomBytes(8_000_000), randomBytes(1000)];
	await store.client().putObject(bucket, 'twice', old);
	const reader = await store.client().getObject(bucket, 'twice');
	const before = readdirSync(join(store.dir, 'blobs')).length;
	await store.client().putObject(bucket, 'twice', fresh);
	expect(readdirSync(join(store.dir, 'blobs'))).toHaveLength(before);
	expect((await bytesOf(reader)).equals(old)).toBe(true);
	expect((await bytesOf(await store.client().getObject(bucket, 'twice'))).equals(fresh)).toBe(true);
});

test('buckets are made, found and removed when empty', async () => {
	const client = store.client();
	expect(await client.bucketExists('second')).toBe(false);
	await client.makeBucket('second');
	expect(await client.bucketExists('second')).toBe(true);
	await client.putObject('second', 'k', 'v');
	await expect(client.removeBucket('second')).rejects.toMatchObject({ code: 'BucketNotEmpty' });
	await client.removeObject('second', 'k');
	await client.removeBucket('second');
	expect((await client.listBuckets()).map(({ name }) => name)).toEqual([bucket]);
	await expect(client.putObject('second', 'k', 'v')).rejects.toMatchObject({
		code: 'NoSuchBucket'
	});
});

test('objects and metadata outlive a restart; half-written bytes do not', async () => {
	await store.client().putObject(bucket, 'stays', 'here', 4, { 'X-Amz-Meta-Bin': 'K3-1' });
	writeFileSync(join(store.dir, 'blobs', 'cut-short'), 'half');
	await store.restart();
	expect(readdirSync(join(store.dir, 'blobs'))).not.toContain('cut-short');
	expect((await bytesOf(await store.client().getObject(bucket, 'stays'))).toString()).toBe('here');
	expect((await store.client().statObject(bucket, 'stays')).metaData).toMatchObject({
		bin: 'K3-1'
	});
});
