import { todayIn } from '$lib/server/donors';
import { action, page } from '$lib/server/people';
import { addWaste, correctWaste, listWaste } from '$lib/server/yard';
import { WasteForm, WasteRef } from '$lib/yard/input';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, { params }: PageServerLoadEvent) => ({
	...(await listWaste(ctx)),
	today: await todayIn(ctx),
	back: { href: `/${params.shop}/scrap`, label: 'Scrap runs' }
}));

const here = ({ params }: RequestEvent, done: string) => ({
	to: `/${params.shop}/scrap/waste?done=${done}`
});

export const actions = {
	add: action('work', WasteForm, async (ctx, input, event: RequestEvent) => {
		await addWaste(ctx, input);
		return here(event, 'Written down');
	}),
	correct: action('work', WasteRef, async (ctx, { id }, event: RequestEvent) => {
		await correctWaste(ctx, id);
		return here(event, 'Taken out of the sums');
	})
};
