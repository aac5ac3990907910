import { getDonor } from '$lib/server/donors';
import { action, page } from '$lib/server/people';
import { finishStripping, getFinish } from '$lib/server/yard';
import { SCRAP_CLASSES } from '$lib/trade';
import { FinishForm } from '$lib/yard/input';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, { params }: PageServerLoadEvent) => {
	const { number, engine, state } = await getDonor(ctx, params.donor);
	return {
		...{ number, engine, state },
		finish: await getFinish(ctx, params.donor),
		classes: SCRAP_CLASSES.map(({ id, said }) => ({ value: id, label: said })),
		back: { href: `/${params.shop}/donors/${params.donor}`, label: params.donor },
		short: number
	};
});

export const actions = {
	default: action('work', FinishForm, async (ctx, input, { params }: RequestEvent) => {
		const made = await finishStripping(ctx, params.donor, input);
		return { to: `/${params.shop}/donors/${params.donor}?done=Stripped&undo=${made}` };
	})
};
