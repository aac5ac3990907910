import { randomBytes } from 'node:crypto';
import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { expect, test } from 'vitest';
import { bucket, bytesOf, itemsOf, trialStore } from './trial.js';

const store = trialStore();
const megabyte = 1024 * 1024;

test.each([
	['a stream of unknown length', false],
	['parts of 5 MB', true]
])(
	'20 MB go through the client as %s and outlive a restart',
	async (name, known) => {
		const bytes = randomBytes(20 * megabyte);
		const pieces = Array.from({ length: 20 }, (_, at) =>
			bytes.subarray(at * megabyte, (at + 1) * megabyte)
		);
		const client = store.client({ partSize: 5 * megabyte });
		const size = known ? bytes.length : undefined;
		const sent = { 'Content-Type': 'image/jpeg', 'X-Amz-Meta-Side': 'left' };
		const { etag } = await client.putObject(bucket, name, Readable.from(pieces), size, sent);
		expect(etag).toMatch(/^[0-9a-f]{32}-4$/);
		await store.restart();
		const found = await store.client().statObject(bucket, name);
		expect(found).toMatchObject({ size: bytes.length, etag });
		expect(found.metaData).toMatchObject({ 'content-type': 'image/jpeg', side: 'left' });
		expect((await bytesOf(await store.client().getObject(bucket, name))).equals(bytes)).toBe(true);
		expect(readdirSync(join(store.dir, 'uploads'))).toEqual([]);
	},
	20_000
);

test('an unfinished upload is listed, and gone once given up', async () => {
	const client = store.client();
	const id = await client.initiateNewMultipartUpload(bucket, 'half', {});
	/** @type {{ key: string, uploadId: string }[]} */
	const open = await itemsOf(client.listIncompleteUploads(bucket, 'ha', true));
	expect(open.map(({ key, uploadId }) => ({ key, uploadId }))).toEqual([
		{ key: 'half', uploadId: id }
	]);
	await client.removeIncompleteUpload(bucket, 'half');
	expect(await itemsOf(client.listIncompleteUploads(bucket, 'ha', true))).toEqual([]);
	await expect(client.statObject(bucket, 'half')).rejects.toMatchObject({ code: 'NotFound' });
});

test('a part that never came, or another etag, does not complete', async () => {
	const client = store.client();
	const id = await client.initiateNewMultipartUpload(bucket, 'odd', {});
	const completed = client.completeMultipartUpload(bucket, 'odd', id, [
		{ part: 1, etag: 'd41d8cd98f00b204e9800998ecf8427e' }
	]);
	await expect(completed).rejects.toMatchObject({ code: 'InvalidPart' });
	const elsewhere = client.completeMultipartUpload(bucket, 'other', id, [{ part: 1, etag: 'x' }]);
	await expect(elsewhere).rejects.toMatchObject({ code: 'NoSuchUpload' });
});
