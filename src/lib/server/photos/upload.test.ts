import { PHOTO_SAID } from '$lib/photos/limits';
import type { RequestEvent } from '@sveltejs/kit';
import { and, eq, inArray } from 'drizzle-orm';
import sharp from 'sharp';
import { beforeAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { testShops, type TestShop } from '../../../../tests/support/shops';
import { inShop, type Context } from '../context';
import { listKeys } from '../storage';
import { actionWithPhotos, addPhotoRow, changeWithPhoto } from '.';
import { photo } from './tables';

process.env.S3_BUCKET = `uploads-${process.pid}-${Date.now()}`;

let ours: TestShop;
beforeAll(async () => {
	({ ours } = await testShops());
});

const picture = (background: string) =>
	sharp({ create: { width: 60, height: 40, channels: 3, background } })
		.png()
		.toBuffer();

interface Sent {
	key?: string;
	field?: string;
	files?: Buffer[];
	fields?: Record<string, string>;
	ctx?: Context;
}

function eventOf({ key, field = 'file', files = [], fields = {}, ctx = ours.ctx }: Sent) {
	const body = new FormData();
	for (const [name, value] of Object.entries(fields)) body.set(name, value);
	for (const bytes of files) body.append(field, new File([new Uint8Array(bytes)], 'a.jpg'));
	const url = new URL('http://localhost/api/ours/x');
	const headers = key ? { 'idempotency-key': key } : undefined;
	const request = new Request(url, { method: 'POST', body, headers });
	return {
		request,
		url,
		params: {},
		route: { id: '/x' },
		locals: { ctx }
	} as never as RequestEvent;
}

const photos = () =>
	inShop(ours.ctx, (tx) => tx.select().from(photo).where(eq(photo.shopId, ours.ctx.shopId)));
const keys = async () => {
	let found = 0;
	for await (const _ of listKeys(`${ours.ctx.shopId}/`)) found += 1;
	return found;
};

describe('a photo sent to the outside edge', () => {
	const take = changeWithPhoto('work', z.object({}), async (ctx, _input, kept) => ({
		status: 201,
		body: await addPhotoRow(ctx, kept)
	}));
	const send = async (sent: Sent) => {
		const answer = await take(eventOf(sent));
		return { status: answer.status, text: await answer.text() };
	};

	it('is there once however often it is sent with its key', async () => {
		const files = [await picture('#b45309')];
		const first = await send({ key: 'upload-1', files });
		const [rows, stored] = [(await photos()).length, await keys()];
		expect(first.status).toBe(201);
		expect(await send({ key: 'upload-1', files })).toEqual(first);
		expect((await photos()).length).toBe(rows);
		expect(await keys()).toBe(stored);
	});

	it('sent five times at once is one row', async () => {
		const files = [await picture('#1d4ed8')];
		const before = (await photos()).length;
		const answers = await Promise.all([1, 2, 3, 4, 5].map(() => send({ key: 'upload-2', files })));
		expect(new Set(answers.map((one) => one.text)).size).toBe(1);
		expect((await photos()).length).toBe(before + 1);
	});

	it('with other bytes under the key, without a key or without a photo changes nothing', async () => {
		const before = [(await photos()).length, await keys()];
		const other = [await picture('#065f46')];
		expect((await send({ key: 'upload-1', files: other })).status).toBe(422);
		expect((await send({ files: other })).status).toBe(400);
		expect(await send({ key: 'upload-3' })).toMatchObject({ status: 400 });
		const reader = await ours.as('reader');
		expect((await send({ key: 'upload-4', files: other, ctx: reader })).status).toBe(403);
		expect([(await photos()).length, await keys()]).toEqual(before);
	});

	it('kept on a phone under another sign-in does not go out under this one', async () => {
		const files = [await picture('#4d7c0f')];
		const before = [(await photos()).length, await keys()];
		const event = eventOf({ key: 'upload-7', files });
		event.request.headers.set('photo-taken-by', 'somebody else');
		const answer = await take({
			...event,
			locals: { ...event.locals, person: { id: 'me' } }
		} as never);
		expect(answer.status).toBe(403);
		expect(await answer.json()).toMatchObject({ message: PHOTO_SAID.taker });
		expect([(await photos()).length, await keys()]).toEqual(before);
	});

	it('that says it is larger than a photo may be is refused before it is read', async () => {
		const event = eventOf({ key: 'upload-8', files: [await picture('#000000')] });
		const headers = { 'idempotency-key': 'upload-8', 'content-length': `${31_000_000}` };
		const request = { headers: new Headers(headers), formData: () => expect.fail('was read') };
		const answer = await take({ ...event, request } as never);
		expect(await answer.json()).toMatchObject({ message: PHOTO_SAID.size });
	});

	it('that is none is refused in words, and so is a body that is no form', async () => {
		const refused = await send({ key: 'upload-5', files: [Buffer.from('<svg/>')] });
		expect(refused.status).toBe(400);
		expect(JSON.parse(refused.text)).toMatchObject({ code: 'bad input', message: PHOTO_SAID.kind });
		const event = eventOf({ key: 'upload-6' });
		const request = new Request(event.url, {
			method: 'POST',
			body: '{}',
			headers: { 'idempotency-key': 'upload-6', 'content-type': 'application/json' }
		});
		expect((await take({ ...event, request } as RequestEvent)).status).toBe(400);
	});
});

describe('a form with photos', () => {
	const Typed = z.object({ note: z.string({ error: 'Enter a note' }) });
	const act = actionWithPhotos('work', Typed, 'photo', async (ctx, { note }, kept) => {
		const ids: number[] = [];
		for (const one of kept) ids.push((await addPhotoRow(ctx, one)).id);
		return { note, ids };
	});
	const fields = (key: string) => ({ idempotencyKey: key, note: 'box' });

	it('sent twice is done once, with another picture under its key not at all', async () => {
		const files = [await picture('#111111'), await picture('#eeeeee')];
		const first = await act(eventOf({ field: 'photo', files, fields: fields('form-1') }));
		const stored = await keys();
		expect(await act(eventOf({ field: 'photo', files, fields: fields('form-1') }))).toEqual(first);
		expect(await keys()).toBe(stored);
		const other = [await picture('#777777')];
		const refused = await act(eventOf({ field: 'photo', files: other, fields: fields('form-1') }));
		expect(refused).toMatchObject({ status: 422 });
		const { ids } = first as { ids: number[] };
		const rows = await inShop(ours.ctx, (tx) =>
			tx.$count(photo, and(eq(photo.shopId, ours.ctx.shopId), inArray(photo.id, ids)))
		);
		expect(rows).toBe(2);
	});

	it('with a field amiss stores no picture and keeps what was typed', async () => {
		const before = await keys();
		const files = [await picture('#222222')];
		const sent = { field: 'photo', files, fields: { idempotencyKey: 'form-2', engine: 'TARN' } };
		expect(await act(eventOf(sent))).toMatchObject({
			status: 400,
			data: { problems: [{ field: 'note', message: 'Enter a note' }], typed: { engine: 'TARN' } }
		});
		expect(await keys()).toBe(before);
	});
});
