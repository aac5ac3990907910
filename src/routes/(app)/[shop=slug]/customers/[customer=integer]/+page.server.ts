import { CustomerEdit, Nothing } from '$lib/customers/input';
import { editCustomer, eraseCustomer, getCustomer } from '$lib/server/customers';
import { action, page } from '$lib/server/people';
import { listWants } from '$lib/server/wants';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('trade', async (ctx, { params }: PageServerLoadEvent) => {
	const id = Number(params.customer);
	return {
		customer: await getCustomer(ctx, id),
		wants: (await listWants(ctx, { customer: id, limit: 100 })).items,
		back: { href: `/${params.shop}/customers`, label: 'Customers' }
	};
});

export const actions = {
	edit: action('trade', CustomerEdit, async (ctx, input, { params, url }: RequestEvent) => {
		await editCustomer(ctx, Number(params.customer), input);
		return { to: `${url.pathname}?done=Saved` };
	}),
	erase: action('run', Nothing, async (ctx, _input, { params }: RequestEvent) => {
		await eraseCustomer(ctx, Number(params.customer));
		return { to: `/${params.shop}/customers?done=Customer deleted` };
	})
};
