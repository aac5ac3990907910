import { readQuestion } from '$lib/find/input';
import { exportParts } from '$lib/server/find';
import { read } from '$lib/server/people';

export const GET = read(
	'see',
	async (ctx, { url }) =>
		new Response(exportParts(ctx, readQuestion(url.searchParams)), {
			headers: {
				'Content-Type': 'text/csv; charset=utf-8',
				'Content-Disposition': 'attachment; filename="parts.csv"'
			}
		})
);
