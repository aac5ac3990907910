import { PutAway } from '$lib/parts/input';
import { putAway } from '$lib/server/parts';
import { change } from '$lib/server/people';

export const POST = change('work', PutAway, async (ctx, input) => ({
	body: await putAway(ctx, input)
}));
