import { PhotoOf } from '$lib/parts/photo-of';
import { photoLinks } from '$lib/photos/links';
import { photographAny } from '$lib/server/parts';
import { changeWithPhoto } from '$lib/server/photos';
import type { RequestEvent } from './$types';

/** A photo of whatever carries that tag or number: for a phone that has no signal to look it up. */
export const POST = changeWithPhoto(
	'work',
	PhotoOf,
	async (ctx, input, kept, { params }: RequestEvent) => {
		const { id } = await photographAny(ctx, input, kept);
		return { status: 201, body: { id, links: photoLinks(params.shop, id) } };
	}
);
