import { PHOTO_BYTES, PHOTO_NONE, PHOTO_SAID } from '$lib/photos/limits';
import type { Ability } from '$lib/people/role';
import { Refused } from '$lib/refusal';
import { json } from '@sveltejs/kit';
import { createHash } from 'node:crypto';
import type { z } from 'zod';
import type { Context } from '../context';
import { formObject, readForm } from '../http/form';
import {
	answerForm,
	changeKey,
	contextFor,
	fingerprint,
	formKey,
	once,
	read,
	wasAnswered
} from '../people';
import { keepPhoto, type KeptPhoto } from './keep';

type Event = Parameters<typeof contextFor>[0];

async function bytesOf(file: File): Promise<Buffer> {
	if (file.size > PHOTO_BYTES) throw new Refused('bad input', PHOTO_SAID.size, 'file');
	return Buffer.from(await file.arrayBuffer());
}

const photosIn = (form: FormData, field: string): File[] =>
	form.getAll(field).filter((value): value is File => value instanceof File && value.size > 0);

const shaOf = (bytes: Buffer) => createHash('sha256').update(bytes).digest('base64url');

/** Cleans and stores photos one after the other; for a change that was answered before, none. */
async function keepNew(ctx: Context, key: string, hash: string, uploads: Buffer[]) {
	const kept: KeptPhoto[] = [];
	if (await wasAnswered(ctx, key, hash)) return kept;
	for (const bytes of uploads) kept.push(await keepPhoto(ctx, bytes));
	return kept;
}

/**
 * A form's action with photos in one of its fields: they are cleaned and stored first, then the verb runs
 * in its transaction. What the store keeps for a form that was refused is swept within the hour.
 */
export function actionWithPhotos<S extends z.ZodType, R, E extends Event>(
	ability: Ability,
	schema: S,
	field: string,
	verb: (ctx: Context, input: z.output<S>, kept: KeptPhoto[], event: E) => Promise<R>
) {
	return (event: E) =>
		answerForm(event, async (form, fields) => {
			const ctx = contextFor(event, ability);
			const uploads = await Promise.all(photosIn(form, field).map(bytesOf));
			const { key, hash } = formKey(event, form, uploads.map(shaOf));
			const input = schema.parse(fields);
			const kept = await keepNew(ctx, key, hash, uploads);
			return once(ctx, key, hash, (ctx) => verb(ctx, input, kept, event));
		});
}

interface Answer {
	status?: number;
	body: unknown;
}

/** One photo sent to the outside edge: multipart with the field `file`, done once per Idempotency-Key. */
export function changeWithPhoto<S extends z.ZodType, E extends Event>(
	ability: Ability,
	schema: S,
	work: (ctx: Context, input: z.output<S>, kept: KeptPhoto, event: E) => Promise<Answer>
) {
	return read<E>(ability, async (ctx, event) => {
		const key = changeKey(event);
		const form = await readForm(event.request);
		const [file] = photosIn(form, 'file');
		if (!file) throw new Refused('bad input', PHOTO_NONE, 'file');
		const { file: _, ...fields } = formObject(form);
		const input = schema.parse(fields);
		const bytes = await bytesOf(file);
		const hash = fingerprint(`POST ${event.url.pathname}`, [fields, shaOf(bytes)]);
		const [kept] = await keepNew(ctx, key, hash, [bytes]);
		const answer = await once(ctx, key, hash, (ctx) => work(ctx, input, kept!, event));
		return json(answer.body, { status: answer.status ?? 200 });
	});
}
