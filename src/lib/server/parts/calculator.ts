import type { Calculation } from '$lib/parts/calculation';
import { verdictOf } from '$lib/parts/verdict';
import type { Verdict } from '$lib/parts/verdict-view';
import { inShop, type Context } from '../context';
import { allow } from '../people';
import { subjectOf } from './verdict-subject';
import { shopFigures } from './verdicts';

const LAST = Number.MAX_SAFE_INTEGER;

/** The verdict on a part that nobody has logged, by the shop's figures and what was typed of it. */
export async function workOut(ctx: Context, asked: Calculation): Promise<Verdict> {
	allow(ctx, 'see terms');
	return inShop(ctx, async (_tx, ctx) => {
		const { policy, season } = await shopFigures(ctx, [asked.kind]);
		const { kind, grade, newCents, copyCents, have } = asked;
		const part = { id: LAST, pulledAt: LAST, engineKey: '', numberKeys: [], inRedBin: false };
		const seenOn = ctx.now.toISOString().slice(0, 10);
		const typed = { copyCents, source: 'typed here', seenOn, stale: false };
		const price = newCents === null ? null : { ...typed, newCents };
		const subject = subjectOf(
			{
				...part,
				kind,
				grade,
				state: 'pulled',
				cause: asked.cause,
				secondCause: null,
				sureness: null
			},
			[],
			price,
			policy
		);
		return verdictOf(
			{ ...subject, stillOn: asked.stillOn, place: have + 1, have },
			policy,
			asked.season ?? season
		);
	});
}
