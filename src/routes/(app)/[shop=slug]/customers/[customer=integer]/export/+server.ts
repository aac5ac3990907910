import { read } from '$lib/server/people';
import { customerFile } from '$lib/server/wants';
import { customerCsv } from '$lib/wants/csv';
import type { RequestEvent } from './$types';

export const GET = read('run', async (ctx, { params, url }: RequestEvent) => {
	const id = Number(params.customer);
	const file = await customerFile(ctx, id);
	const csv = url.searchParams.get('as') === 'csv';
	const body = csv ? customerCsv(file.customer, file.wants) : JSON.stringify(file, null, '\t');
	return new Response(body, {
		headers: {
			'Content-Type': csv ? 'text/csv; charset=utf-8' : 'application/json',
			'Content-Disposition': `attachment; filename="customer-${id}.${csv ? 'csv' : 'json'}"`,
			'Cache-Control': 'private, no-store'
		}
	});
});
