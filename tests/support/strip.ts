import type { APIRequestContext } from '@playwright/test';
import { SAFE_TICKS } from '../../src/lib/trade';
import { expect } from './browser';
import { BASE } from './visitor';

type Sent = Record<string, unknown>;

/** A change at the outside edge, by whoever is signed in. */
export async function change(
	request: APIRequestContext,
	method: 'post' | 'patch',
	path: string,
	data: Sent = {}
): Promise<Sent> {
	const answer = await request[method](`/api/osiergate/${path}`, {
		headers: { 'Idempotency-Key': crypto.randomUUID(), origin: BASE },
		data
	});
	expect(answer.ok(), `${method} ${path}: ${await answer.text()}`).toBe(true);
	return answer.json();
}

/** Takes in an engine of its own for a journey. Returns its number. */
export async function takeInFor(request: APIRequestContext, engine: Sent): Promise<string> {
	const model = `BENCH-${crypto.randomUUID().slice(0, 6)}`;
	const { number } = await change(request, 'post', 'donors', {
		maker: 'Sollane',
		model,
		...engine
	});
	return String(number);
}

/** Opens its gates and puts it on the bench. */
export async function putOnBench(request: APIRequestContext, number: string): Promise<void> {
	await change(request, 'post', `donors/${number}/release`, { route: 'own', on: '2026-01-05' });
	await change(request, 'patch', `donors/${number}`, { safeTicks: SAFE_TICKS.map(({ id }) => id) });
	await change(request, 'post', `donors/${number}/strip`);
}

export async function donorOnBench(request: APIRequestContext, engine: Sent): Promise<string> {
	const number = await takeInFor(request, { sureness: 'seen', ...engine });
	await putOnBench(request, number);
	return number;
}
