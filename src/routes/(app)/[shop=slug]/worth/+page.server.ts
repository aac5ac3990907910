import { engineKey } from '$lib/codes/number';
import { SeasonSwitch } from '$lib/people/input';
import { LimitsForm, ownLimits } from '$lib/people/limits-input';
import {
	FamilyForm,
	KindForm,
	kindFiguresOf,
	ownOf,
	PolicyForm,
	policyOf
} from '$lib/people/policy-input';
import { action, editPolicy, getPolicyRow, getShop, page, setSeason } from '$lib/server/people';
import { whatItTaught } from '$lib/server/parts';
import { pricedEngines } from '$lib/server/prices';
import { isKindId } from '$lib/trade';

export const load = page('see costs', async (ctx, { url }) => {
	const { policy, version } = await getPolicyRow(ctx);
	const kind = url.searchParams.get('kind') ?? '';
	return {
		policy,
		version,
		kind: isKindId(kind) ? kind : null,
		engines: await pricedEngines(ctx),
		taught: await whatItTaught(ctx),
		wide: true
	};
});

const done = (said: string) => ({ to: `?done=${encodeURIComponent(said)}` });

export const actions = {
	figures: action('run', PolicyForm, async (ctx, form) => {
		const { policy } = await getPolicyRow(ctx);
		const { currency } = await getShop(ctx);
		const own = ownOf(policyOf(policy, form, currency));
		await editPolicy(ctx, { own, version: form.version });
		return done('Policy saved: every verdict counts with it from now on');
	}),
	season: action('run', SeasonSwitch, async (ctx, { season }) => {
		await setSeason(ctx, season);
		return done(`Season: ${season}`);
	}),
	family: action('run', FamilyForm, async (ctx, { engine, mark, version }) => {
		const { policy } = await getPolicyRow(ctx);
		const { [engineKey(engine)]: _, ...others } = policy.families;
		const families = mark === 'some' ? others : { ...others, [engineKey(engine)]: mark };
		await editPolicy(ctx, { own: ownOf({ ...policy, families }), version });
		return done(`${engine}: ${mark} about`);
	}),
	limits: action('run', LimitsForm, async (ctx, { kind, limits, version }) => {
		const { policy } = await getPolicyRow(ctx);
		const { [kind]: _, ...others } = policy.limits;
		const own = ownLimits(limits);
		const all = Object.keys(own).length > 0 ? { ...others, [kind]: own } : others;
		const next = ownOf({ ...policy, limits: all as typeof policy.limits });
		await editPolicy(ctx, { own: next, version });
		return { to: `?kind=${kind}&done=Limits saved#limits` };
	}),
	kind: action('run', KindForm, async (ctx, form) => {
		const { policy } = await getPolicyRow(ctx);
		const { currency } = await getShop(ctx);
		const { [form.kind]: _, ...others } = policy.kinds;
		const figures = kindFiguresOf(form, currency);
		const kinds = Object.keys(figures).length > 0 ? { ...others, [form.kind]: figures } : others;
		await editPolicy(ctx, { own: ownOf({ ...policy, kinds }), version: form.version });
		return { to: `?kind=${form.kind}&done=Figures of the kind saved#kinds` };
	})
};
