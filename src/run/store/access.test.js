import { createHash } from 'node:crypto';
import aws4 from 'aws4';
import { expect, test } from 'vitest';
import { accessKey, bucket, secretKey, trialStore } from './trial.js';

const store = trialStore();
const credentials = { accessKeyId: accessKey, secretAccessKey: secretKey };

test('a wrong secret and an unknown key are refused', async () => {
	const wrong = store.client({ secretKey: 'another secret' });
	await expect(wrong.putObject(bucket, 'k', 'v')).rejects.toMatchObject({
		code: 'SignatureDoesNotMatch'
	});
	const unknown = store.client({ accessKey: 'stranger' });
	await expect(unknown.putObject(bucket, 'k', 'v')).rejects.toMatchObject({
		code: 'InvalidAccessKeyId'
	});
	await expect(store.client().statObject(bucket, 'k')).rejects.toMatchObject({ code: 'NotFound' });
});

test.each(['GET', 'PUT', 'DELETE', 'POST'])(
	'%s without a signature is refused in XML',
	async (method) => {
		const body = method === 'PUT' || method === 'POST' ? 'x' : undefined;
		const answer = await store.fetch(`/${bucket}/k`, { method, body });
		expect(answer.status).toBe(403);
		expect(await answer.text()).toContain('<Code>AccessDenied</Code>');
	}
);

/** @param {Record<string, string>} [more] */
function signedPut(more = {}) {
	const body = 'the bytes';
	const hash = createHash('sha256').update(body).digest('hex');
	const headers = { 'x-amz-content-sha256': hash, 'content-length': '9', ...more };
	const request = {
		host: store.host(),
		path: `/${bucket}/by%20hand`,
		method: 'PUT',
		service: 's3',
		body
	};
	return aws4.sign({ ...request, region: 'us-east-1', headers }, credentials).headers;
}

test('a signature made by another program is accepted, and covers the body and the headers', async () => {
	const put = { method: 'PUT', body: 'the bytes' };
	const path = `/${bucket}/by%20hand`;
	expect((await store.fetch(path, { ...put, headers: signedPut() })).status).toBe(200);
	const other = await store.fetch(path, { ...put, body: 'THE BYTES', headers: signedPut() });
	expect(await other.text()).toContain('<Code>XAmzContentSHA256Mismatch</Code>');
	const extra = { ...signedPut(), 'x-amz-meta-added': 'later' };
	expect((await store.fetch(path, { ...put, headers: extra })).status).toBe(403);
	const elsewhere = await store.fetch(`/${bucket}/other`, { ...put, headers: signedPut() });
	expect(await elsewhere.text()).toContain('<Code>SignatureDoesNotMatch</Code>');
});

test('a signature of yesterday is refused', async () => {
	const headers = signedPut({ 'X-Amz-Date': '20200101T000000Z' });
	const answer = await store.fetch(`/${bucket}/by%20hand`, {
		method: 'PUT',
		body: 'the bytes',
		headers
	});
	expect(await answer.text()).toContain('<Code>RequestTimeTooSkewed</Code>');
});
