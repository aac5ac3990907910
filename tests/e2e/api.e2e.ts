import { expect, request, test, type APIRequestContext } from '@playwright/test';
import { randomUUID } from 'node:crypto';
import sharp from 'sharp';
import { BASE, visitor } from '../support/visitor';

const SHOP = '/api/osiergate';
const run = Date.now().toString(36).toUpperCase();
const engine = `Sollane ZK-${run}`;
/** A number of this run alone, written with dashes and an O. */
const number = `QV-${run}-O7`;
const plain = number.replaceAll('-', '').toLowerCase();
const day = new Date().toISOString().slice(0, 10);

/** Makes a key on the page of the people, as the owner does. */
async function makeKey(role: string): Promise<string> {
	const owner = await visitor('owner@osiergate.example');
	const answer = await owner.post('/osiergate/people?/key', {
		headers: { accept: 'text/html' },
		form: { name: `script of ${role} ${run}`, role, idempotencyKey: randomUUID() }
	});
	const shown = /data-testid="new-key"[^>]*>(ep_[\w-]+)</.exec(await answer.text());
	expect(shown, 'the page shows the new key').not.toBeNull();
	await owner.dispose();
	return shown![1]!;
}

const script = (key: string) =>
	request.newContext({
		baseURL: BASE,
		maxRedirects: 0,
		extraHTTPHeaders: { authorization: `Bearer ${key}` }
	});

let bench: APIRequestContext;
let counter: APIRequestContext;
let reader: APIRequestContext;

/** A change with a key of its own; the body of the answer once the status is as expected. */
async function change(
	who: APIRequestContext,
	path: string,
	data: object,
	status = 200,
	method: 'post' | 'put' | 'patch' = 'post'
) {
	const headers = { 'idempotency-key': randomUUID() };
	const answer = await who[method](`${SHOP}/${path}`, { data, headers });
	expect(answer.status(), `${method} ${path}: ${await answer.text()}`).toBe(status);
	return answer.json();
}

async function look(who: APIRequestContext, path: string, status = 200) {
	const answer = await who.get(`${SHOP}/${path}`);
	expect(answer.status(), `get ${path}: ${await answer.text()}`).toBe(status);
	return answer.json();
}

const found = async (q: string) =>
	(await look(reader, `parts?q=${encodeURIComponent(q)}`)).items.map(
		(item: { tag: string }) => item.tag
	);

test.beforeAll(async () => {
	[bench, counter, reader] = await Promise.all([
		script(await makeKey('bench')),
		script(await makeKey('counter')),
		script(await makeKey('reader'))
	]);
});
test.afterAll(async () => {
	for (const one of [bench, counter, reader]) await one?.dispose();
});

test('a donor comes in, gives its parts, and they are priced, found, proved and scrapped', async () => {
	const donor = await change(
		bench,
		'donors',
		{
			maker: 'Sollane',
			model: `ZK-${run}`,
			serial: '47?11',
			class: 'WB',
			fittings: ['recoil'],
			cause: 'overheated',
			sureness: 'seen'
		},
		201
	);
	expect(donor).toMatchObject({ state: 'whole', engine, number: expect.stringMatching(/^D\d+$/) });
	const D = `donors/${donor.number}`;

	const picture = await sharp({
		create: { width: 900, height: 600, channels: 3, background: '#9a6f35' }
	})
		.jpeg()
		.toBuffer();
	const file = { name: 'plate.jpg', mimeType: 'image/jpeg', buffer: picture };
	const sent = await bench.post(`${SHOP}/${D}/photos`, {
		multipart: { file, shot: 'label' },
		headers: { 'idempotency-key': randomUUID() }
	});
	expect(sent.status(), await sent.text()).toBe(201);
	const { links } = await sent.json();
	const thumb = await reader.get(links.thumb);
	expect(thumb.headers()['content-type']).toBe('image/webp');
	expect((await thumb.body()).length).toBeLessThan(15_000);

	await change(bench, `${D}/parts`, { kind: 'coil', grade: 'untested' }, 409);
	const shut = await change(bench, `${D}/strip`, {}, 409);
	expect(shut).toMatchObject({ code: 'gate', message: expect.stringContaining('release') });
	await change(bench, `${D}/release`, { route: 'own', on: day });
	const safeTicks = ['fuel', 'bowl', 'oil', 'battery', 'blade', 'plug', 'openings'];
	expect(await change(bench, D, { safeTicks }, 200, 'patch')).toMatchObject({ safeTicks });
	expect(await change(bench, `${D}/strip`, {})).toMatchObject({ state: 'on the bench' });

	const pull = (body: object) => change(bench, `${D}/parts`, body, 201);
	const recoil = await pull({ kind: 'recoil', grade: 'good used', note: 'rope renewed' });
	const coil = await pull({ kind: 'coil', grade: 'untested', numbers: [number] });
	const muffler = await pull({ kind: 'muffler', grade: 'usable', label: 'cage dented' });
	expect([recoil.state, coil.donor]).toEqual(['pulled', donor.number]);

	const [bin] = (await look(bench, 'bins')).items.filter((one: { red: boolean }) => !one.red);
	const moved = await change(bench, `parts/${recoil.tag}/move`, { bin: bin.address });
	expect(moved).toMatchObject({ state: 'shelved', bin: bin.address });

	const price = { kind: 'recoil', engine, newCents: 6200, source: 'Counter book', seenOn: day };
	await change(bench, 'prices', price, 403, 'put');
	expect(await change(counter, 'prices', price, 200, 'put')).toMatchObject({ newCents: 6200 });
	const verdict = await look(bench, `parts/${recoil.tag}/verdict`);
	expect(['keep', 'close call', 'let it go']).toContain(verdict.verdict);
	expect(verdict.terms.length).toBeGreaterThan(5);
	expect((await look(reader, `parts/${recoil.tag}/verdict`)).terms).toEqual([]);
	expect((await look(bench, `parts/${coil.tag}/verdict`)).verdict).toBe('needs a price');

	expect(await found(`recoyl zk-${run}`)).toEqual([recoil.tag]);
	expect(await found(plain)).toEqual([coil.tag]);
	expect(await found(plain.replace(/o7$/, '07'))).toEqual([coil.tag]);
	expect(await found(coil.tag.toLowerCase())).toContain(coil.tag);
	const none = await look(reader, `parts?q=${encodeURIComponent(`fuel tank zk-${run}`)}`);
	expect(none.donors).toContainEqual(expect.objectContaining({ number: donor.number }));

	const proof = { how: 'bench test cold', figure: 11.2, unit: 'kV', passed: true };
	expect((await change(bench, `parts/${coil.tag}/proof`, proof)).proofs).toHaveLength(1);
	expect(
		await change(bench, `parts/${muffler.tag}/scrap`, { reason: 'dent goes through' })
	).toMatchObject({
		state: 'scrapped'
	});
	expect(await found(muffler.tag)).toEqual([]);

	expect(await look(reader, `tags/${recoil.tag}`)).toMatchObject({ what: 'part' });
	expect(await look(reader, `tags/${donor.tag}`)).toMatchObject({ what: 'box' });
});

test('the calculator gives a gain and says what is wrong with a figure', async () => {
	const figures = {
		usedCents: 4600,
		chanceGood: 0.6,
		comeBack: 0.08,
		comeBackCents: 3900,
		callsPerYear: 1.5,
		place: 1,
		moneyRate: Math.log(1.1),
		dyingRate: Math.log(1.12),
		shelfCents: 150,
		scrapCents: 20,
		labourNow: 3400 / 60,
		labour: 3400 / 60,
		minutesNow: 9,
		minutesLater: 14
	};
	const gain = (data: object) => reader.post(`${SHOP}/worth/gain`, { data });
	expect(await (await gain(figures)).json()).toMatchObject({
		gainCents: 759,
		timing: 'when-called',
		keepUpTo: 4
	});
	const wrong = await gain({ ...figures, chanceGood: 2 });
	expect(wrong.status()).toBe(400);
	expect(await wrong.json()).toMatchObject({ code: 'bad input', field: 'chanceGood' });
	expect((await reader.post(`${SHOP}/worth/nothing`, { data: {} })).status()).toBe(404);
});

test('a change is done once per key', async () => {
	const send = (data: object, key?: string) =>
		bench.post(`${SHOP}/parts`, { data, ...(key ? { headers: { 'idempotency-key': key } } : {}) });
	const part = { kind: 'muffler', grade: 'usable', engine, note: `once ${run}` };
	const key = randomUUID();
	const first = await send(part, key);
	const again = await send(part, key);
	expect([first.status(), again.status()]).toEqual([201, 201]);
	expect(await again.json()).toEqual(await first.json());
	expect(await found(`"once ${run}"`)).toHaveLength(1);

	const other = await send({ ...part, note: 'another' }, key);
	expect(other.status()).toBe(422);
	expect((await other.json()).code).toBe('key reused');
	const without = await send(part);
	expect(without.status()).toBe(400);
	expect((await without.json()).message).toContain('Idempotency-Key');

	const storm = randomUUID();
	const answers = await Promise.all(
		Array.from({ length: 8 }, () => send({ ...part, note: `storm ${run}` }, storm))
	);
	const tags = await Promise.all(answers.map(async (answer) => (await answer.json()).tag));
	expect(new Set(tags).size).toBe(1);
});

test('another shop is the same as none, and a key opens its own shop only', async () => {
	for (const path of ['parts', 'donors/D1', 'tags/00000']) {
		const foreign = await reader.get(`/api/thrennick/${path}`);
		const unknown = await reader.get(`/api/no-such-shop/${path}`);
		expect([404, 401]).toContain(foreign.status());
		expect(foreign.status()).toBe(unknown.status());
		expect(await foreign.text()).toBe(await unknown.text());
	}
	const neighbour = await visitor('owner@thrennick.example');
	const theirs = (await (await neighbour.get('/api/thrennick/parts?limit=1')).json()).items[0].tag;
	const foreign = await reader.get(`${SHOP}/parts/${theirs}`);
	const unknown = await reader.get(`${SHOP}/parts/00000`);
	expect([foreign.status(), unknown.status()]).toEqual([404, 404]);
	expect(await foreign.text()).toBe(await unknown.text());
	expect(await found(theirs)).toEqual([]);
	await neighbour.dispose();
});

test('a stranger gets nothing, a wrong key neither, and faults are words', async () => {
	const stranger = await request.newContext({ baseURL: BASE });
	expect((await stranger.get(`${SHOP}/parts`)).status()).toBe(401);
	const wrong = await script('ep_not-a-key-of-anybody');
	expect((await wrong.get(`${SHOP}/parts`)).status()).toBe(401);
	expect(await look(reader, 'parts?limit=1000', 400)).toEqual({
		code: 'bad input',
		field: 'limit',
		message: 'Enter a limit of 1 to 100'
	});
	await change(reader, 'parts', { kind: 'coil', grade: 'usable' }, 403);
	await change(bench, 'parts', { kind: 'no such kind', grade: 'usable' }, 400);
	const edge = await (await stranger.get('/api/openapi.json')).json();
	expect(edge.openapi).toBe('3.1.0');
	expect(Object.keys(edge.paths)).toContain('/api/{shop}/donors/{donor}/parts');
	await stranger.dispose();
});
