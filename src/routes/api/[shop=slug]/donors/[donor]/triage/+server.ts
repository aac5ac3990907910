import { TriageInput } from '$lib/donors/triage';
import { getTriage, saveTriage } from '$lib/server/donors';
import { change, read } from '$lib/server/people';
import type { RequestEvent } from './$types';

export const GET = read<RequestEvent>('see', (ctx, { params }) => getTriage(ctx, params.donor));

export const POST = change('work', TriageInput, async (ctx, input, { params }: RequestEvent) => {
	await saveTriage(ctx, params.donor, input);
	return { body: await getTriage(ctx, params.donor) };
});
