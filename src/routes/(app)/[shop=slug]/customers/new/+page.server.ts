import { CustomerInput } from '$lib/customers/input';
import { addCustomer } from '$lib/server/customers';
import { action, page } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const load = page('trade', (_ctx, { params }) => ({
	back: { href: `/${params.shop}/customers`, label: 'Customers' }
}));

export const actions = {
	default: action('trade', CustomerInput, async (ctx, input, { params }: RequestEvent) => {
		const { id } = await addCustomer(ctx, input);
		return { to: `/${params.shop}/customers/${id}?done=Customer entered` };
	})
};
