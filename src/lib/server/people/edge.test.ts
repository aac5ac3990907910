import { NotFound } from '$lib/refusal';
import type { RequestEvent } from '@sveltejs/kit';
import { sql } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { inShop } from '../context';
import { action } from './doorkeeper';
import { change, read } from './edge';
import { addKey } from './keys';
import { answered } from './tables';

let ours: TestShop;
beforeAll(async () => {
	({ ours } = await testShops());
});

function eventOf(body: BodyInit | null, headers: Record<string, string> = {}) {
	const url = new URL('http://localhost/api/ours/x');
	const request = new Request(url, { method: body === null ? 'GET' : 'POST', body, headers });
	const locals = { ctx: ours.ctx };
	return { request, url, params: {}, route: { id: '/x' }, locals } as never as RequestEvent;
}

const said = async (answer: Promise<Response>) => {
	const { status, headers } = await answer;
	expect(headers.get('content-type')).toContain('application/json');
	return { status, ...((await (await answer).json()) as object) };
};

describe('every fault of the outside edge is data', () => {
	const fails = (thrown: unknown) => said(read('see', () => Promise.reject(thrown))(eventOf(null)));

	it('what we know in its own words, the rest by a number and without its words', async () => {
		expect(await fails(new NotFound())).toEqual({
			status: 404,
			code: 'not found',
			message: 'This is not here'
		});
		const unknown = await fails(new Error('connection to 10.0.0.7 as canary failed'));
		expect(unknown).toMatchObject({ status: 500, code: 'fault', id: expect.any(String) });
		expect(JSON.stringify(unknown)).not.toContain('canary');
	});

	it('figures, days and characters that no column holds are the sender’s to mend', async () => {
		const odd = [sql`select ${'a\0b'}::text`, sql`select ${'3000000000'}::int`];
		for (const query of [...odd, sql`select ${'0000-01-01'}::date`]) {
			const ask = read('see', (ctx) => inShop(ctx, (tx) => tx.execute(query)));
			expect(await said(ask(eventOf(null)))).toMatchObject({ status: 400, code: 'bad input' });
		}
	});

	it('a change that is no JSON, has no key or too long a one does nothing', async () => {
		let done = 0;
		const put = change('work', z.object({}), async () => ({ body: { done: ++done } }));
		const key = { 'idempotency-key': 'edge-1' };
		expect(await said(put(eventOf('{', key)))).toMatchObject({ status: 400 });
		expect(await said(put(eventOf('{}')))).toMatchObject({ status: 400 });
		const long = { 'idempotency-key': 'k'.repeat(201) };
		expect(await said(put(eventOf('{}', long)))).toMatchObject({ status: 400 });
		expect(done).toBe(0);
	});

	it('a repeat is answered to the letter', async () => {
		const put = change('work', z.object({ a: z.number() }), async (ctx) => ({
			status: 201,
			body: { zebra: 1, at: ctx.now, apple: { y: 2, x: 1 } }
		}));
		const send = async () => {
			const answer = await put(eventOf('{"a":1}', { 'idempotency-key': 'edge-2' }));
			return [answer.status, await answer.text()];
		};
		const first = await send();
		expect(await send()).toEqual(first);
		expect(first[0]).toBe(201);
	});
});

it('a key for scripts is shown once and kept nowhere, not even for the same form again', async () => {
	const Input = z.object({ name: z.string(), role: z.literal('reader') });
	const make = action('run', Input, addKey, () => ({ key: null }));
	const form = () => {
		const body = new FormData();
		body.set('idempotencyKey', 'make-a-key');
		body.set('name', 'loader');
		body.set('role', 'reader');
		return eventOf(body);
	};
	const { key } = (await make(form())) as { key: string };
	expect(key).toMatch(/^ep_/);
	expect(await make(form())).toEqual({ key: null });
	const kept = await inShop(ours.ctx, (tx) => tx.select().from(answered));
	expect(JSON.stringify(kept)).not.toContain(key);
});
