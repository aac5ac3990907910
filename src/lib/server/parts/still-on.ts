import type { KindStillOn } from '$lib/parts/view';
import { kindsOn, minutesToPull, type EngineClass, type Fitting, type Kind } from '$lib/trade';
import { inShop, type Context } from '../context';
import { donorRow } from '../donors';
import { getPolicy } from '../people';
import { chanceBy } from './chance-on';
import { loggedKinds } from './off-donor';
import { kindVerdicts } from './verdicts';

/** A piece goes with its whole. */
const isLogged = (each: Kind, logged: Set<string>) =>
	logged.has(each.id) || (each.partOf !== null && logged.has(each.partOf));

const MOST_FIRST = (a: KindStillOn, b: KindStillOn) =>
	Number(a.never !== null) - Number(b.never !== null) ||
	(b.gainCents ?? -Infinity) - (a.gainCents ?? -Infinity) ||
	0;

/** The kinds that a donor still carries, most worthwhile first, with what pulling each takes. */
export const kindsStillOn = (ctx: Context, donorRef: string): Promise<KindStillOn[]> =>
	inShop(ctx, async (tx, ctx) => {
		const donor = await donorRow(tx, ctx, donorRef);
		if (!donor.engineClass) return [];
		const logged = await loggedKinds(tx, ctx, donor.id);
		const there = kindsOn(donor.engineClass as EngineClass, donor.fittings as Fitting[]).filter(
			(each) => !isLogged(each, logged)
		);
		const ids = there.map(({ id }) => id);
		const verdicts = await kindVerdicts(ctx, donor.id, ids);
		const policy = await getPolicy(ctx);
		const rows: KindStillOn[] = [];
		for (const { id, name, system } of there) {
			const { chance, level, never } = chanceBy(policy, id, donor);
			const verdict = verdicts.get(id);
			rows.push({
				kind: id,
				kindName: name,
				system,
				chance,
				level,
				minutes: minutesToPull(id, ids),
				verdict: verdict?.verdict ?? null,
				gainCents: verdict?.gainCents ?? null,
				never
			});
		}
		return rows.sort(MOST_FIRST);
	});
