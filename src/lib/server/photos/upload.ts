import { PHOTO_BYTES, PHOTO_SAID } from '$lib/photos/limits';
import { Refused } from '$lib/refusal';
import { json } from '@sveltejs/kit';
import { createHash } from 'node:crypto';
import type { z } from 'zod';
import type { Ability } from '$lib/people/role';
import type { Context } from '../context';
import { formObject } from '../http/form';
import { action, changeKey, contextFor, fingerprint, once, read } from '../people';
import { keepPhoto, type KeptPhoto } from './keep';

type Event = Parameters<typeof contextFor>[0];

async function bytesOf(file: File): Promise<Buffer> {
	if (file.size > PHOTO_BYTES) throw new Refused('bad input', PHOTO_SAID.size, 'file');
	return Buffer.from(await file.arrayBuffer());
}

const photosIn = (form: FormData, field: string): File[] =>
	form.getAll(field).filter((value): value is File => value instanceof File && value.size > 0);

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
	return async (event: E) => {
		let kept: KeptPhoto[] = [];
		let refused: unknown;
		try {
			const ctx = contextFor(event, ability);
			const files = photosIn(await event.request.clone().formData(), field);
			for (const file of files) kept = [...kept, await keepPhoto(ctx, await bytesOf(file))];
		} catch (thrown) {
			refused = thrown;
		}
		const run = action(ability, schema, async (ctx, input: z.output<S>, event: E) => {
			if (refused) throw refused;
			return verb(ctx, input, kept, event);
		});
		return run(event);
	};
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
		const form = await event.request.formData();
		const [file] = photosIn(form, 'file');
		if (!file) throw new Refused('bad input', 'Choose a photo.', 'file');
		const { file: _, ...fields } = formObject(form);
		const input = schema.parse(fields);
		const bytes = await bytesOf(file);
		const sha = createHash('sha256').update(bytes).digest('base64url');
		const kept = await keepPhoto(ctx, bytes);
		const hash = fingerprint(`POST ${event.url.pathname}`, [fields, sha]);
		const answer = await once(ctx, key, hash, (ctx) => work(ctx, input, kept, event));
		return json(answer.body, { status: answer.status ?? 200 });
	});
}
