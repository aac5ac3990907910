import { CustomerInput } from '$lib/customers/input';
import { addCustomer, listCustomers } from '$lib/server/customers';
import { change, read } from '$lib/server/people';

export const GET = read('trade', (ctx, { url }) => {
	const ask = (name: string) => url.searchParams.get(name) ?? undefined;
	return listCustomers(ctx, {
		q: ask('q'),
		limit: Number(ask('limit')) || undefined,
		after: Number(ask('cursor')) || undefined
	});
});

export const POST = change('trade', CustomerInput, async (ctx, input) => ({
	status: 201,
	body: await addCustomer(ctx, input)
}));
