import { ShotInput } from '$lib/donors/input';
import { photoLinks } from '$lib/photos/links';
import { addKeptPhoto } from '$lib/server/donors';
import { changeWithPhoto } from '$lib/server/photos';
import type { RequestEvent } from './$types';

export const POST = changeWithPhoto(
	'work',
	ShotInput,
	async (ctx, { shot }, kept, { params }: RequestEvent) => {
		const { id } = await addKeptPhoto(ctx, params.donor, kept, shot);
		return { status: 201, body: { id, links: photoLinks(params.shop, id) } };
	}
);
