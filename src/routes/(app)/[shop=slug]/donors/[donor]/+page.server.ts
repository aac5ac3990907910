import { DonorEditForm } from '$lib/donors/form';
import { CauseForm, ReleaseInput, SafeInput } from '$lib/donors/input';
import { causeOptions, classOptions, fittingOptions } from '$lib/donors/options';
import {
	addBox,
	editDonor,
	getDonor,
	listMakers,
	releaseDonor,
	tickSafe,
	todayIn
} from '$lib/server/donors';
import { action, page } from '$lib/server/people';
import { SAFE_TICKS } from '$lib/trade';
import { z } from 'zod';
import type { PageServerLoadEvent, RequestEvent } from './$types';
import { back, moves } from './moves';
import { photos } from './photos';

export const load = page('see', async (ctx, { params, url }: PageServerLoadEvent) => {
	const donor = await getDonor(ctx, params.donor);
	return {
		donor,
		today: await todayIn(ctx),
		makers: await listMakers(ctx),
		causeOptions,
		classOptions,
		fittingOptions,
		ticks: SAFE_TICKS,
		removed: url.searchParams.get('removed'),
		back: { href: `/${params.shop}/donors`, label: 'Donors' },
		short: `${donor.number} · ${donor.tag}`
	};
});

export const actions = {
	...moves,
	...photos,
	cause: action('work', CauseForm, async (ctx, input, event: RequestEvent) => {
		await editDonor(ctx, event.params.donor, input);
		return back(event, 'Cause of death saved');
	}),
	release: action('work', ReleaseInput, async (ctx, input, event: RequestEvent) => {
		await releaseDonor(ctx, event.params.donor, input);
		return back(event, 'Release recorded');
	}),
	safe: action('work', SafeInput, async (ctx, input, event: RequestEvent) => {
		await tickSafe(ctx, event.params.donor, input);
		return back(event, 'Ticks saved');
	}),
	edit: action('work', DonorEditForm, async (ctx, input, event: RequestEvent) => {
		await editDonor(ctx, event.params.donor, input);
		return back(event, 'Saved');
	}),
	box: action('work', z.object({}), async (ctx, _input, event: RequestEvent) => {
		const { tag } = await addBox(ctx, event.params.donor);
		return back(event, `Another box: ${tag}`);
	})
};
