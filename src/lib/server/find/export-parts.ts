import { csvHead, csvRow } from '$lib/find/csv';
import type { FindQuery } from '$lib/find/input';
import type { Context } from '../context';
import { findParts } from './find-parts';

const MOST_A_PAGE = 100;

/** Everything that answers as the lines of a CSV, page by page, so that no transaction stays open while it is sent. */
export function exportParts(ctx: Context, query: FindQuery): ReadableStream<Uint8Array> {
	const text = new TextEncoder();
	let cursor: string | null | undefined;
	return new ReadableStream({
		start: (stream) => stream.enqueue(text.encode(csvHead())),
		async pull(stream) {
			if (cursor === null) return stream.close();
			const asked = { ...query, limit: MOST_A_PAGE, together: 'no' as const };
			const { items, next } = await findParts(ctx, { ...asked, cursor: cursor ?? undefined });
			if (items.length > 0) stream.enqueue(text.encode(items.map(csvRow).join('')));
			cursor = next;
		}
	});
}
