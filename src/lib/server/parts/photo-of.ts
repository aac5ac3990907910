import type { PhotoOf } from '$lib/parts/photo-of';
import type { Context } from '../context';
import { addKeptPhoto } from '../donors';
import type { KeptPhoto } from '../photos';
import { findTag } from '../tags';
import { hangPhoto } from './photo';

/** Ties a kept picture to whatever the tag hangs on, or to the donor of that number. */
export async function photographAny(
	ctx: Context,
	{ of, shot }: PhotoOf,
	kept: KeptPhoto
): Promise<{ id: number }> {
	const found = await findTag(ctx, of);
	if (found?.what !== 'part') return addKeptPhoto(ctx, of, kept, shot);
	const { id } = await hangPhoto(ctx, found.code, kept);
	return { id };
}
