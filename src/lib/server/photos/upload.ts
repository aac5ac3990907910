import { PHOTO_BYTES, PHOTO_NONE, PHOTO_SAID } from '$lib/photos/limits';
import type { Ability } from '$lib/people/role';
import { Refused } from '$lib/refusal';
import { json } from '@sveltejs/kit';
import { createHash } from 'node:crypto';
import type { z } from 'zod';
import type { Context } from '../context';
import { readPhotoForm } from '../http/multipart';
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
import { room } from './turns';

type Event = Parameters<typeof contextFor>[0];

/** What is round a photo in the body that carries it. */
const WRAPPING = 64 * 1024;

/** A body is in memory two or three times while it is read, so only so many bytes of them are let in at once. */
const enter = room(40 * 1024 * 1024);

const weightOf = ({ headers }: Request) => Number(headers.get('content-length')) || PHOTO_BYTES;

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
		enter(weightOf(event.request), () =>
			answerForm(event, async (form, fields) => {
				const ctx = contextFor(event, ability);
				const uploads = await Promise.all(photosIn(form, field).map(bytesOf));
				const { key, hash } = formKey(event, form, uploads.map(shaOf));
				const input = schema.parse(fields);
				const kept = await keepNew(ctx, key, hash, uploads);
				return once(ctx, key, hash, (ctx) => verb(ctx, input, kept, event));
			})
		);
}

async function photoSent(request: Request) {
	const { files, fields } = await readPhotoForm(request);
	const bytes = files.file?.bytes;
	if (!bytes?.length) throw new Refused('bad input', PHOTO_NONE, 'file');
	if (bytes.length > PHOTO_BYTES) throw new Refused('bad input', PHOTO_SAID.size, 'file');
	const typed = Object.entries(fields).filter(([, value]) => value.trim() !== '');
	return { fields: Object.fromEntries(typed), bytes };
}

interface Answer {
	status?: number;
	body: unknown;
}

/** A phone that kept a photo says whose it is: it must not go out under whoever signed in there since. */
function checkTaker({ request, locals }: Event): void {
	const taker = request.headers.get('photo-taken-by');
	if (taker && taker !== locals.person?.id) throw new Refused('role', PHOTO_SAID.taker, 'file');
}

/** One photo sent to the outside edge: multipart with the field `file`, done once per Idempotency-Key. */
export function changeWithPhoto<S extends z.ZodType, E extends Event>(
	ability: Ability,
	schema: S,
	work: (ctx: Context, input: z.output<S>, kept: KeptPhoto, event: E) => Promise<Answer>
) {
	return read<E>(ability, async (ctx, event) => {
		checkTaker(event);
		const key = changeKey(event);
		const weight = weightOf(event.request);
		if (weight > PHOTO_BYTES + WRAPPING) throw new Refused('bad input', PHOTO_SAID.size, 'file');
		return enter(weight, async () => {
			const { fields, bytes } = await photoSent(event.request);
			const input = schema.parse(fields);
			const hash = fingerprint(`POST ${event.url.pathname}`, [fields, shaOf(bytes)]);
			const [kept] = await keepNew(ctx, key, hash, [bytes]);
			const answer = await once(ctx, key, hash, (ctx) => work(ctx, input, kept!, event));
			return json(answer.body, { status: answer.status ?? 200 });
		});
	});
}
