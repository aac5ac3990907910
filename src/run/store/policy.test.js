import { expect, test } from 'vitest';
import { bucket, bytesOf, trialStore } from './trial.js';

const store = trialStore();

/** @param {Date} [until] @param {{ secretKey?: string }} [other] */
async function policy(until = new Date(Date.now() + 60_000), other = {}) {
	const made = store.client(other).newPostPolicy();
	made.setBucket(bucket);
	made.setKey('d12/one.jpg');
	made.setContentType('image/jpeg');
	made.setContentLengthRange(10, 100);
	made.setExpires(until);
	return (await store.client(other).presignedPostPolicy(made)).formData;
}

/** @param {Record<string, string>} fields @param {number} [size] */
function send(fields, size = 50) {
	const form = new FormData();
	for (const [name, value] of Object.entries(fields)) form.append(name, value);
	form.append('file', new Blob([Buffer.alloc(size, 7)], { type: 'image/jpeg' }), 'one.jpg');
	return store.fetch(`/${bucket}`, { method: 'POST', body: form });
}

test('a form with a signed policy is stored with its type', async () => {
	expect((await send(await policy())).status).toBe(204);
	const stored = await store.client().statObject(bucket, 'd12/one.jpg');
	expect(stored).toMatchObject({ size: 50, metaData: { 'content-type': 'image/jpeg' } });
	expect(await bytesOf(await store.client().getObject(bucket, 'd12/one.jpg'))).toHaveLength(50);
});

test.each([
	['too large', 101, 'EntityTooLarge'],
	['too small', 9, 'EntityTooSmall']
])('a file that is %s is refused', async (_, size, code) => {
	const answer = await send(await policy(), size);
	expect(answer.status).toBe(400);
	expect(await answer.text()).toContain(`<Code>${code}</Code>`);
});

test.each([
	['another key', { key: 'd13/one.jpg' }],
	['another type', { 'content-type': 'text/html' }],
	['a field the policy does not name', { 'x-amz-meta-extra': '1' }]
])('%s is refused', async (_, change) => {
	const fields = Object.entries({ ...(await policy()) });
	const kept = fields.filter(([name]) => !(name.toLowerCase() in change));
	const answer = await send({ ...Object.fromEntries(kept), ...change });
	expect(answer.status).toBe(403);
	expect(await answer.text()).toContain('<Code>AccessDenied</Code>');
});

test('a policy that was changed, signed otherwise, or not signed at all is refused', async () => {
	const fields = await policy();
	const wider = Buffer.from(fields.policy ?? '', 'base64')
		.toString()
		.replace('100', '999');
	const changed = await send({ ...fields, policy: Buffer.from(wider).toString('base64') }, 500);
	expect(await changed.text()).toContain('<Code>SignatureDoesNotMatch</Code>');
	const wrong = await send(await policy(undefined, { secretKey: 'another secret' }));
	expect(await wrong.text()).toContain('<Code>SignatureDoesNotMatch</Code>');
	expect((await send({ key: 'd12/one.jpg' })).status).toBe(403);
});

test('a policy ends when it says', async () => {
	const answer = await send(await policy(new Date(Date.now() - 1000)));
	expect(answer.status).toBe(403);
	expect(await answer.text()).toContain('expired');
});
