import { Nothing } from '$lib/parts/input';
import { photoLinks } from '$lib/photos/links';
import { hangPhoto } from '$lib/server/parts';
import { changeWithPhoto } from '$lib/server/photos';
import type { RequestEvent } from './$types';

export const POST = changeWithPhoto(
	'work',
	Nothing,
	async (ctx, _input, kept, { params }: RequestEvent) => {
		const { id } = await hangPhoto(ctx, params.part, kept);
		return { status: 201, body: { id, links: photoLinks(params.shop, id) } };
	}
);
