import { isPhotoSize } from '$lib/photos/links';
import { NotFound } from '$lib/refusal';
import { read } from '$lib/server/people';
import { readPhoto } from '$lib/server/photos';
import { Readable } from 'node:stream';
import type { RequestEvent } from './$types';

/** The bytes under an id never change, so a browser keeps them for an hour, then asks whether it still may. */
export const GET = read<RequestEvent>('see', async (ctx, { params, request }) => {
	if (!isPhotoSize(params.size)) throw new NotFound();
	const stream = await readPhoto(ctx, Number(params.id), params.size);
	const headers = {
		etag: `"${params.id}-${params.size}"`,
		'cache-control': 'private, max-age=3600',
		// Whoever signs in next on this device carries another cookie, and gets nothing out of its cache.
		vary: 'cookie, authorization'
	};
	if (request.headers.get('if-none-match') === headers.etag) {
		stream.destroy();
		return new Response(null, { status: 304, headers });
	}
	return new Response(Readable.toWeb(stream) as ReadableStream, {
		headers: { ...headers, 'content-type': 'image/webp', 'x-content-type-options': 'nosniff' }
	});
});
