import type { Ability } from '$lib/people/role';
import { Refused } from '$lib/refusal';
import { isHttpError, isRedirect, json } from '@sveltejs/kit';
import type { z } from 'zod';
import type { Context } from '../context';
import { FAULT_SAID } from '../http/fault';
import { bodyRefused } from '../http/form';
import { logFault } from '../log';
import { contextFor, knownFault, type Event } from './doorkeeper';
import { fingerprint, once } from './once';

/** Every fault as data, with the same fields: what we know in its own words, the rest with a number. */
export function jsonFault(thrown: unknown, where: Event): Response {
	try {
		const { status, code, problems } = knownFault(thrown);
		const { field, message } = problems[0]!;
		return json({ code, message, ...(field ? { field } : {}) }, { status });
	} catch (unknown) {
		if (isRedirect(unknown) || isHttpError(unknown)) throw unknown;
		const id = logFault(unknown, { status: 500, route: where.route.id });
		return json({ code: 'fault', message: FAULT_SAID, id }, { status: 500 });
	}
}

/** A GET of the outside edge. A Response passes as it is (pictures). */
export function read<E extends Event>(
	ability: Ability,
	work: (ctx: Context, event: E) => Promise<unknown>
) {
	return async (event: E): Promise<Response> => {
		try {
			const body = await work(contextFor(event, ability), event);
			return body instanceof Response ? body : json(body);
		} catch (thrown) {
			return jsonFault(thrown, event);
		}
	};
}

interface Answer {
	status?: number;
	body: unknown;
}

/** A change at the outside edge, done once per Idempotency-Key. */
export function change<S extends z.ZodType, E extends Event>(
	ability: Ability,
	schema: S,
	work: (ctx: Context, input: z.output<S>, event: E) => Promise<Answer>
) {
	return async (event: E): Promise<Response> => {
		try {
			const ctx = contextFor(event, ability);
			const key = changeKey(event);
			const sent = await sentBody(event.request);
			const input = schema.parse(sent);
			const hash = fingerprint(`${event.request.method} ${event.url.pathname}`, sent);
			const answer = await once(ctx, key, hash, (ctx) => work(ctx, input, event));
			return json(answer.body, { status: answer.status ?? 200 });
		} catch (thrown) {
			return jsonFault(thrown, event);
		}
	};
}

/** The key of a change; without one nothing is done. */
export function changeKey(event: Event): string {
	const key = event.request.headers.get('idempotency-key');
	if (!key || key.length > 200)
		throw new Refused(
			'bad input',
			'Send an Idempotency-Key header of up to 200 characters with every change.'
		);
	return key;
}

async function sentBody(request: Request): Promise<unknown> {
	try {
		const text = await request.text();
		return text === '' ? {} : JSON.parse(text);
	} catch (fault) {
		throw bodyRefused(fault, 'Send the fields as JSON.');
	}
}
