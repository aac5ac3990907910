import { DEFAULT_POLICY } from '$lib/people/policy';
import { yearlyToContinuous } from '$lib/worth';

const MONEY = yearlyToContinuous(DEFAULT_POLICY.moneyRate, 'money');

/** Money is discounted to the start at the shop's cost of money: a dollar later is worth less. */
export const discount = (at: number): number => Math.exp(-MONEY * at);

/** Where every logged part went; together they are all that were logged. */
export type Fate = 'sold' | 'failed' | 'died' | 'dropped' | 'left over';

export class Books {
	/** Discounted cents that fell in each year. */
	readonly years: number[];
	minutes = 0;
	logged = 0;
	comeBacks = 0;
	readonly fates: Record<Fate, number> = {
		sold: 0,
		failed: 0,
		died: 0,
		dropped: 0,
		'left over': 0
	};
	scrapCents = 0;

	constructor(years: number) {
		this.years = new Array<number>(Math.ceil(years) + 1).fill(0);
	}

	flow(at: number, cents: number): void {
		const year = Math.min(Math.floor(at), this.years.length - 1);
		this.years[year] = (this.years[year] ?? 0) + cents * discount(at);
	}

	scrap(at: number, cents: number): void {
		this.scrapCents += cents * discount(at);
		this.flow(at, cents);
	}

	/** Bench minutes at a labour rate in cents. */
	work(at: number, minutes: number, rate: number): void {
		this.minutes += minutes;
		this.flow(at, -minutes * rate);
	}

	/** The shelf cost of a part from one time to another, spread over the years it stood there. */
	stood(from: number, to: number, yearlyCents: number): void {
		for (let at = from; at < to;) {
			const end = Math.min(to, Math.floor(at) + 1);
			const year = Math.min(Math.floor(at), this.years.length - 1);
			const cost = (yearlyCents * (discount(at) - discount(end))) / MONEY;
			this.years[year] = (this.years[year] ?? 0) - cost;
			at = end;
		}
	}

	/** Discounted cents from this year on. */
	since(year: number): number {
		return this.years.slice(year).reduce((sum, cents) => sum + cents, 0);
	}
}

/** A level yearly amount over these years that is worth as much as the discounted total. */
export function yearly(total: number, from: number, to: number): number {
	return (total * MONEY) / (discount(from) - discount(to));
}
