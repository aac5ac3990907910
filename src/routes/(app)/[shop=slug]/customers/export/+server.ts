import { exportCustomers } from '$lib/server/customers';
import { read } from '$lib/server/people';
import { customersCsv } from '$lib/wants/csv';

export const GET = read(
	'run',
	async (ctx) =>
		new Response(customersCsv(await exportCustomers(ctx)), {
			headers: {
				'Content-Type': 'text/csv; charset=utf-8',
				'Content-Disposition': 'attachment; filename="customers.csv"',
				'Cache-Control': 'private, no-store'
			}
		})
);
