import { StartWalk } from '$lib/walks/input';
import { change, read } from '$lib/server/people';
import { getWalk, listWalks, startWalk } from '$lib/server/walks';

export const GET = read('see', listWalks);

export const POST = change('work', StartWalk, async (ctx, input) => {
	const { id } = await startWalk(ctx, input);
	return { status: 201, body: await getWalk(ctx, id) };
});
