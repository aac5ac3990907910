import type { Calculation } from '$lib/parts/calculation';
import type { ShopFigures } from '$lib/parts/learned-view';
import { verdictOf } from '$lib/parts/verdict';
import type { Verdict, VerdictSubject } from '$lib/parts/verdict-view';
import { inShop, type Context } from '../context';
import { allow } from '../people';
import { subjectOf } from './verdict-subject';
import { shopFigures } from './verdicts';

const LAST = Number.MAX_SAFE_INTEGER;
/** A part that is in nobody's records. */
const UNKNOWN = {
	id: LAST,
	pulledAt: LAST,
	engineKey: '',
	numberKeys: [],
	inRedBin: false,
	state: 'pulled',
	secondCause: null,
	sureness: null
} as const;

function subjectIn(ctx: Context, asked: Calculation, policy: ShopFigures): VerdictSubject {
	const { kind, grade, cause, newCents, copyCents, have, stillOn } = asked;
	const seenOn = ctx.now.toISOString().slice(0, 10);
	const typed = { copyCents, source: 'typed here', seenOn, stale: false };
	const price = newCents === null ? null : { ...typed, newCents };
	const subject = subjectOf({ ...UNKNOWN, kind, grade, cause }, [], price, policy);
	return { ...subject, stillOn, place: have + 1, have };
}

/** The verdict on a part that nobody has logged, by the shop's figures and what was typed of it. */
export async function workOut(ctx: Context, asked: Calculation): Promise<Verdict> {
	allow(ctx, 'see terms');
	const { policy, season } = await inShop(ctx, (_tx, ctx) => shopFigures(ctx, [asked.kind]));
	return verdictOf(subjectIn(ctx, asked, policy), policy, asked.season ?? season);
}
