import type { Ability } from '$lib/people/role';
import { Refused } from '$lib/refusal';
import { error, fail, redirect, type ActionFailure, type RequestEvent } from '@sveltejs/kit';
import type { z } from 'zod';
import type { Context } from '../context';
import { faultOf } from '../http/fault';
import { formObject, readForm, typedAgain, typedText } from '../http/form';
import { allow } from './allow';
import { fingerprint, once } from './once';

export type Event = RequestEvent;

/** The context of the request when its member may do this; refused in words when not. */
export function contextFor(event: Event, ability: Ability): Context {
	const { ctx } = event.locals;
	if (!ctx) throw new Error('A shop route without a shop in its address');
	allow(ctx, ability);
	return ctx;
}

/** A page's data. */
export function page<T, E extends Event>(
	ability: Ability,
	load: (ctx: Context, event: E) => Promise<T> | T
) {
	return async (event: E): Promise<T> => {
		try {
			return await load(contextFor(event, ability), event);
		} catch (thrown) {
			const { status, problems } = knownFault(thrown);
			error(status, problems[0]!.message);
		}
	};
}

/** A redirect or an error of the framework passes; what we know gets its status. */
export function knownFault(thrown: unknown) {
	if (thrown && typeof thrown === 'object' && 'status' in thrown && !(thrown instanceof Error))
		throw thrown;
	return faultOf(thrown);
}

interface Failed {
	problems: { field: string; message: string }[];
	typed: Record<string, string | string[]>;
}

/** What a form's page gets back: nothing when the verb said where to go on to. */
type Kept<R> = R extends { to: string } ? never : R;

const goesOn = (done: unknown): done is { to: string } =>
	typeof done === 'object' && done !== null && 'to' in done && typeof done.to === 'string';

/** The key of a form, and the fingerprint of what it carries; the bytes of its files are said by the caller. */
export function formKey(event: Event, form: FormData, files: string[] = []) {
	const typed = formObject(form);
	const key = typed.idempotencyKey;
	if (typeof key !== 'string' || key.length > 200)
		throw new Refused('bad input', 'Reload the page and send the form again.');
	const where = event.url.pathname + event.url.search;
	return { key, hash: fingerprint(where, [typedText(typed), files]) };
}

/** Answers a form: read it, do what it asks, redirect; a refusal comes back with what was typed. */
export async function answerForm<R>(
	{ request }: Event,
	work: (form: FormData, fields: ReturnType<typeof formObject>) => Promise<R>
): Promise<ActionFailure<Failed> | Kept<R>> {
	let form: FormData | undefined;
	let done: R;
	try {
		form = await readForm(request);
		const { idempotencyKey: _, ...fields } = formObject(form);
		done = await work(form, fields);
	} catch (thrown) {
		const { status, problems } = knownFault(thrown);
		return fail(status, { problems, typed: form ? typedAgain(form) : {} });
	}
	if (goesOn(done)) redirect(303, done.to);
	return done as Kept<R>;
}

/** A form's action, done once per key; `kept` as `once` takes it. */
export function action<S extends z.ZodType, R, E extends Event>(
	ability: Ability,
	schema: S,
	verb: (ctx: Context, input: z.output<S>, event: E) => Promise<R>,
	kept?: (done: R) => unknown
) {
	return (event: E) =>
		answerForm(event, async (form, fields) => {
			const ctx = contextFor(event, ability);
			const { key, hash } = formKey(event, form);
			const input = schema.parse(fields);
			return once(ctx, key, hash, (ctx) => verb(ctx, input, event), kept);
		});
}
