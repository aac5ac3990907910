import { callsRule, type CallsRow } from '$lib/parts/calls-rule';
import { DEFAULT_POLICY } from '$lib/people/policy';
import type { Family, Item } from './market';
import { watched, type Calendar } from './season';

// the figures are worked out anew this often, in years
const FRESH = 0.5;

/** Calls learned by the shop's own rule: every call is seen, all of the time. */
export class LearnedCalls {
	private readonly rows = new Map<Item, CallsRow>();
	private readonly marks = new Map<string, number>();
	private readonly usual = new Map<string, number>();
	private readonly known = new Map<Item, number>();
	private until = 0;
	private rule: ReturnType<typeof callsRule> = () => {
		throw new Error('nothing was asked yet');
	};

	constructor(
		families: readonly Family[],
		private readonly calendar: Calendar
	) {
		families.forEach(({ items }, family) => {
			for (const item of items) {
				const engine = String(family);
				this.rows.set(item, { kind: item.kind.id, engine, calls: 0, years: 0 });
				this.marks.set(engine, item.mark);
				this.usual.set(item.kind.id, item.kind.callsPerYear);
			}
		});
	}

	called(item: Item): void {
		const row = this.rows.get(item);
		if (row) row.calls++;
	}

	private renew(at: number): void {
		this.until = (Math.floor(at / FRESH) + 1) * FRESH;
		this.known.clear();
		const years = watched(at, this.calendar);
		this.rule = callsRule(
			[...this.rows.values()].map((row) => ({ ...row, years })),
			{
				usual: (kind) => this.usual.get(kind) ?? 0,
				mark: (engine) => this.marks.get(engine) ?? 1,
				worth: DEFAULT_POLICY.priors.calls
			}
		);
	}

	perYear(item: Item, at: number): number {
		if (item.kind.callsPerYear === 0) return 0;
		if (at >= this.until) this.renew(at);
		const found = this.known.get(item);
		if (found !== undefined) return found;
		const { mean } = this.rule(item.kind.id, this.rows.get(item)?.engine ?? '', item.mark);
		this.known.set(item, mean);
		return mean;
	}
}
