import aws4 from 'aws4';
import { expect, test } from 'vitest';
import { accessKey, bucket, secretKey, trialStore } from './trial.js';

const store = trialStore();
const credentials = { accessKeyId: accessKey, secretAccessKey: secretKey };

/** @param {string} url */
const pathOf = (url) => url.replace(/^https?:\/\/[^/]+/, '');

test('a signed address puts and gets without any header', async () => {
	const put = pathOf(await store.client().presignedPutObject(bucket, 'a+b/c d.jpg', 60));
	expect((await store.fetch(put, { method: 'PUT', body: 'picture' })).status).toBe(200);
	const get = pathOf(await store.client().presignedGetObject(bucket, 'a+b/c d.jpg', 60));
	expect(await (await store.fetch(get)).text()).toBe('picture');
	const signed = aws4.sign(
		{
			host: store.host(),
			path: `/${bucket}/a%2Bb/c%20d.jpg?X-Amz-Expires=60`,
			service: 's3',
			signQuery: true
		},
		credentials
	);
	expect(await (await store.fetch(signed.path)).text()).toBe('picture');
});

test('a signed address that was changed is refused', async () => {
	const get = pathOf(await store.client().presignedGetObject(bucket, 'a+b/c d.jpg', 60));
	for (const changed of [
		get.replace('c%20d', 'other'),
		get.replace('X-Amz-Expires=60', 'X-Amz-Expires=600'),
		get.replace(/.$/, (last) => (last === '0' ? '1' : '0')),
		`${get}&response-content-type=text%2Fhtml`
	]) {
		expect(changed).not.toBe(get);
		const answer = await store.fetch(changed);
		expect(answer.status).toBe(403);
		expect(await answer.text()).toContain('<Code>SignatureDoesNotMatch</Code>');
	}
	expect((await store.fetch(get, { method: 'PUT', body: 'x' })).status).toBe(403);
});

test('a signed address ends when it says', async () => {
	const long = new Date(Date.now() - 61_000);
	const late = await store.client().presignedUrl('GET', bucket, 'a+b/c d.jpg', 60, {}, long);
	const answer = await store.fetch(pathOf(late));
	expect(answer.status).toBe(403);
	expect(await answer.text()).toContain('expired');
});

test('a page of another origin may ask first and then send', async () => {
	const origin = 'http://localhost:3000';
	const asked = {
		'access-control-request-method': 'PUT',
		'access-control-request-headers': 'content-type'
	};
	const path = pathOf(await store.client().presignedPutObject(bucket, 'from-page', 60));
	const preflight = await store.fetch(path, { method: 'OPTIONS', headers: { origin, ...asked } });
	expect(preflight.status).toBe(204);
	expect(preflight.headers.get('access-control-allow-origin')).toBe('*');
	expect(preflight.headers.get('access-control-allow-methods')).toContain('PUT');
	expect(preflight.headers.get('access-control-allow-headers')).toBe('content-type');
	const put = await store.fetch(path, { method: 'PUT', body: 'x', headers: { origin } });
	expect(put.headers.get('access-control-expose-headers')).toContain('etag');
	const refused = await store.fetch(`/${bucket}/from-page`, { headers: { origin } });
	expect(refused.status).toBe(403);
	expect(refused.headers.get('access-control-allow-origin')).toBe('*');
});
