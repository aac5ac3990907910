import { CauseForm } from '$lib/donors/input';
import { TriageForm, TriageUndo } from '$lib/donors/triage';
import { editDonor, getDonor, getTriage, saveTriage, undoTriage } from '$lib/server/donors';
import { action, page } from '$lib/server/people';
import {
	causeSaid,
	kind,
	kindsOn,
	testsInPlace,
	triage,
	triageFor,
	type EngineClass,
	type Fitting
} from '$lib/trade';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = page('work', async (ctx, { params }: PageServerLoadEvent) => {
	const donor = await getDonor(ctx, params.donor);
	const look = await getTriage(ctx, params.donor);
	const engineClass = donor.class as EngineClass | null;
	const { causes, cautions } = triage(look.answers, engineClass);
	const kinds = engineClass ? kindsOn(engineClass, donor.fittings as Fitting[]) : [];
	const ids = kinds.map(({ id }) => id);
	return {
		donor,
		look,
		questions: triageFor(engineClass),
		causes: causes.map((one) => ({ ...one, said: causeSaid(one.cause) })),
		cautions,
		tests: testsInPlace(ids, look.answers).map((one) => ({ ...one, name: kind(one.kind).name })),
		shut: donor.state === 'stripped' || donor.state === 'gone',
		back: { href: `/${params.shop}/donors/${donor.number}`, label: `Donor ${donor.number}` },
		short: donor.number
	};
});

const here = ({ url }: RequestEvent, done: string) => ({
	to: `${url.pathname}?done=${encodeURIComponent(done)}#suggests`
});

export const actions = {
	look: action('work', TriageForm, async (ctx, input, event: RequestEvent) => {
		await saveTriage(ctx, event.params.donor, input);
		return here(event, 'Kept with the donor');
	}),
	undo: action('work', TriageUndo, async (ctx, input, event: RequestEvent) => {
		await undoTriage(ctx, event.params.donor, input.event);
		return here(event, 'Taken back');
	}),
	cause: action('work', CauseForm, async (ctx, input, event: RequestEvent) => {
		await editDonor(ctx, event.params.donor, input);
		return here(event, `Cause of death: ${causeSaid(input.cause)}, ${input.sureness}`);
	})
};
