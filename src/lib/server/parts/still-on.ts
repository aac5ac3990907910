import { verdictOf } from '$lib/parts/verdict';
import type { KindStillOn } from '$lib/parts/view';
import { kindsOn, minutesToPull, type EngineClass, type Fitting, type Kind } from '$lib/trade';
import { inShop, type Context } from '../context';
import type { Tx } from '../db';
import { donorRow, type DonorRow } from '../donors';
import { chanceBy } from './chance-on';
import { loggedKinds } from './off-donor';
import { kindSubjects } from './verdicts';

/** A piece goes with its whole. */
const isLogged = (each: Kind, logged: Set<string>) =>
	logged.has(each.id) || (each.partOf !== null && logged.has(each.partOf));

/** The kinds that a donor still carries; none while nobody has said its class. */
export async function kindsThere(tx: Tx, ctx: Context, donor: DonorRow): Promise<Kind[]> {
	if (!donor.engineClass) return [];
	const logged = await loggedKinds(tx, ctx, donor.id);
	return kindsOn(donor.engineClass as EngineClass, donor.fittings as Fitting[]).filter(
		(each) => !isLogged(each, logged)
	);
}

const MOST_FIRST = (a: KindStillOn, b: KindStillOn) =>
	Number(a.never !== null) - Number(b.never !== null) ||
	(b.gainCents ?? -Infinity) - (a.gainCents ?? -Infinity) ||
	0;

/** The kinds that a donor still carries, most worthwhile first, with what pulling each takes. */
export const kindsStillOn = (ctx: Context, donorRef: string): Promise<KindStillOn[]> =>
	inShop(ctx, async (tx, ctx) => {
		const donor = await donorRow(tx, ctx, donorRef);
		const there = await kindsThere(tx, ctx, donor);
		const ids = there.map(({ id }) => id);
		const { policy, season, subjects } = await kindSubjects(ctx, donor.id, ids);
		const rows: KindStillOn[] = [];
		for (const { id, name, system } of there) {
			const { chance, level, never } = chanceBy(policy, id, donor);
			const verdict = verdictOf(subjects.get(id)!, policy, season);
			rows.push({
				kind: id,
				kindName: name,
				system,
				chance,
				level,
				minutes: minutesToPull(id, ids),
				verdict: verdict.verdict,
				gainCents: verdict.gainCents,
				waitingFor: verdict.waitingFor,
				never
			});
		}
		return rows.sort(MOST_FIRST);
	});
