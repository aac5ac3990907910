import type { APIRequestContext } from '@playwright/test';
import { randomUUID } from 'node:crypto';
import { expect, test } from '../support/browser';
import { hostileFiles, type Hostile } from '../support/hostile';
import { watched } from '../support/server-process';
import { BASE, visitor } from '../support/visitor';

const key = () => ({ 'idempotency-key': randomUUID() });

async function send(member: APIRequestContext, donor: string, { name, bytes }: Hostile) {
	const began = performance.now();
	const file = { name: `${name}.jpg`, mimeType: 'image/jpeg', buffer: bytes };
	const answer = await member.post(`/api/osiergate/donors/${donor}/photos`, {
		headers: key(),
		multipart: { file }
	});
	return { status: answer.status(), body: await answer.json(), took: performance.now() - began };
}

test('hostile files are refused in words or cleaned, alone and twenty at once', async () => {
	test.setTimeout(120_000);
	const bench = await visitor('bench@osiergate.example');
	const taken = await bench.post('/api/osiergate/donors', {
		headers: key(),
		data: { model: 'P1 HOSTILE' }
	});
	const { number } = await taken.json();
	const files = await hostileFiles();
	const shown = async () =>
		(await (await bench.get(`/api/osiergate/donors/${number}`)).json()).photos.length;

	await test.step('alone', async () => {
		for (const file of files) {
			const { status, body, took } = await send(bench, number, file);
			expect([file.name, status, body.message]).toEqual([
				file.name,
				file.said === null ? 201 : 400,
				file.said ?? undefined
			]);
			// A second on a quiet machine; this one is at other work too.
			expect(took, file.name).toBeLessThan(5000);
		}
		expect(await shown()).toBe(1);
	});

	await test.step('twenty at once', async () => {
		const { grown, waits } = await watched(BASE, async () => {
			const answers = await Promise.all(
				[...files, ...files].map((file) => send(bench, number, file))
			);
			const done = answers.filter(({ status }) => status === 201);
			expect(done).toHaveLength(2);
			expect(answers.filter(({ status }) => status === 400)).toHaveLength(files.length * 2 - 2);
		});
		expect(grown, 'MB of memory').toBeLessThan(200);
		expect(waits[Math.floor(waits.length * 0.95)], 'ms until /livez answers').toBeLessThan(1000);
	});
	expect(await shown()).toBe(3);
});
