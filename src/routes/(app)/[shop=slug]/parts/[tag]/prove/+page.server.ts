import { ProofForm } from '$lib/parts/form';
import { limitsOf } from '$lib/parts/limits';
import { provePart } from '$lib/server/parts';
import { action, getPolicy, page } from '$lib/server/people';
import { kind, testFields, testsHot } from '$lib/trade';
import { after, loadSheet } from '../sheet';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, event: PageServerLoadEvent) => {
	const sheet = await loadSheet(ctx, event, 'prove');
	const { kind: id } = sheet.part;
	const fields = testFields(id, limitsOf(await getPolicy(ctx), id));
	return { ...sheet, howTested: kind(id).howTested, hot: testsHot(id), fields };
});

export const actions = {
	default: action('work', ProofForm, async (ctx, input, event: RequestEvent) => {
		const { tag } = await provePart(ctx, event.params.tag, input);
		return after(event, { tag }, input.passed ? 'Passed' : 'Failed: it goes to the red bin');
	})
};
