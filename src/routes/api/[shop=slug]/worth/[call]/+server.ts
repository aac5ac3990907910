import { NotFound, Refused } from '$lib/refusal';
import { read } from '$lib/server/people';
import {
	allocate,
	carry,
	decide,
	gain,
	keepCleaning,
	learnChance,
	learnRate,
	learnShare,
	pullPlan,
	usedPrice,
	WorthError
} from '$lib/worth';
import type { RequestEvent } from './$types';

const calls: Record<string, ((input: never) => object) | undefined> = {
	usedPrice,
	gain,
	keepCleaning,
	pullPlan,
	decide,
	allocate,
	carry,
	learnChance,
	learnRate,
	learnShare
};

async function sentFigures(request: Request): Promise<never> {
	try {
		return (await request.json()) as never;
	} catch {
		throw new Refused('bad input', 'Send the figures as JSON.');
	}
}

/** The calculator itself: figures in, figures out, nothing is kept. */
export const POST = read('see', async (_ctx, { params, request }: RequestEvent) => {
	const call = Object.hasOwn(calls, params.call) ? calls[params.call] : undefined;
	if (!call) throw new NotFound(`There is no calculation called ${params.call}`);
	const figures = await sentFigures(request);
	try {
		return call(figures);
	} catch (thrown) {
		if (thrown instanceof WorthError) throw new Refused('bad input', thrown.message, thrown.field);
		throw thrown;
	}
});
