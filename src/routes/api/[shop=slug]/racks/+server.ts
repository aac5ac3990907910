import { RackInput } from '$lib/bins/input';
import { makeRack } from '$lib/server/bins';
import { change } from '$lib/server/people';

export const POST = change('work', RackInput, async (ctx, input) => ({
	status: 201,
	body: await makeRack(ctx, input)
}));
