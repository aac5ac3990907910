import { CustomerEdit, Nothing } from '$lib/customers/input';
import { editCustomer, eraseCustomer, getCustomer } from '$lib/server/customers';
import { change, read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read('trade', (ctx, { params }: RequestEvent) =>
	getCustomer(ctx, Number(params.customer))
);

// Answers of changes are kept to be given again: nothing of a person is in them.
export const PATCH = change('trade', CustomerEdit, async (ctx, input, { params }: RequestEvent) => {
	await editCustomer(ctx, Number(params.customer), input);
	return { body: { id: Number(params.customer), version: input.version + 1 } };
});

export const DELETE = change('run', Nothing, async (ctx, _input, { params }: RequestEvent) => {
	await eraseCustomer(ctx, Number(params.customer));
	return { body: { id: Number(params.customer) } };
});
