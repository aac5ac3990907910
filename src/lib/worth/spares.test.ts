import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { gain, yearlyToContinuous, type GainInput } from './index';
import { gammaBelow, gammaQuantile } from './incomplete-gamma';

const plain: GainInput = {
	...{ usedCents: 3000, chanceGood: 1, comeBack: 0, comeBackCents: 0, callsPerYear: 0.5 },
	...{ place: 1, moneyRate: 0.1, dyingRate: 0, shelfCents: 0, scrapCents: 0, labourNow: 0 },
	...{ labour: 0, minutesNow: 0, minutesLater: 0 }
};
const worth = (part: GainInput) => gain(part).terms.whenCalled / 100;
/** Chance that Poisson calls of this mean are k at most. */
const atMost = (k: number, mean: number) => (k < 0 ? 0 : 1 - gammaBelow(mean, k + 1));
const exactly = (k: number, mean: number) => atMost(k, mean) - atMost(k - 1, mean);

describe('waiting and discounting, against published figures', () => {
	// OpenStax 2022, Principles of Finance, section 16.2; the book adds rounded terms: 2,835.63
	it('present value at 9 % a year', () => {
		const rate = yearlyToContinuous(0.09, 'money');
		const terms = [2000, 4000, 5000, 5000, 5000, 5000].map(
			(cash, at) => cash * Math.exp(-rate * (at + 1))
		);
		expect(terms.map((term) => term.toFixed(2))).toEqual([
			...['1834.86', '3366.72', '3860.92', '3542.13', '3249.66', '2981.34']
		]);
		expect(terms.reduce((sum, term) => sum + term, -16_000)).toBeCloseTo(2835.6194, 4);
	});

	// OpenStax 2022, Principles of Finance: a perpetuity of 2 at 7 %, an annuity of 25,000 at 8 %
	it('perpetuity and annuity', () => {
		const yearly = (share: number) => Math.exp(-yearlyToContinuous(share, 'money'));
		expect((2 * yearly(0.07)) / (1 - yearly(0.07))).toBeCloseTo(28.57, 2);
		const q = yearly(0.08);
		expect((25_000 * q * (1 - q ** 5)) / (1 - q)).toBeCloseTo(99_817.75, 2);
	});

	// Ross 2014, Introduction to Probability Models: Laplace transform of the exponential
	it('a Poisson sale, the third one, and one that may spoil', () => {
		expect(worth(plain)).toBeCloseTo(25, 10);
		expect(worth({ ...plain, place: 3 })).toBeCloseTo(17.361111, 6);
		expect(worth({ ...plain, dyingRate: 0.1 })).toBeCloseTo(21.428571, 6);
	});

	it('25 % a year is ln 1.25 continuous, not 0.25', () => {
		const quick = { ...plain, usedCents: 4000, callsPerYear: 2 };
		const rate = yearlyToContinuous(0.25, 'money');
		expect(worth({ ...quick, moneyRate: rate })).toBeCloseTo(35.9851, 4);
		expect(worth({ ...quick, moneyRate: 0.25 })).toBeCloseTo(35.5556, 4);
	});
});

describe('how many spares, against published rules', () => {
	// Tersine and Toelle 1984, "Optimum stock levels for excess inventory items"
	it.each([
		[50, 20, 25, 50, 0.2, 100, 3.3],
		[40, 8, 10, Math.sqrt((2 * 12 * 10) / (0.25 * 40)), 0.25, 12, 3.608248]
	])(
		'keeps the time supply: price %d, salvage %d',
		(price, salvage, order, lot, hold, yearly, t0) => {
			// what a kept unit saves: its price, its share of an order and of the cycle stock
			const saved = price + order / lot + (price * hold * lot) / (2 * yearly);
			const unit = {
				...plain,
				...{ usedCents: saved * 100, scrapCents: salvage * 100, callsPerYear: yearly },
				...{ shelfCents: price * hold * 100, moneyRate: 0 }
			};
			const keep = yearly * t0;
			const margin = (place: number) => worth({ ...unit, place }) - salvage;
			expect(margin(1) - (price * hold * (keep - 1)) / yearly).toBeCloseTo(0, 4);
			expect(margin(Math.ceil(keep - 1e-6) + 1)).toBeLessThan(0);
			expect(margin(Math.floor(keep - 1e-6))).toBeGreaterThan(0);
			expect(gain(unit).keepUpTo).toBe(Math.floor(keep - 1e-6));
		}
	);

	// Silver, Pyke and Thomas 2017, Inventory and Production Management: dispose W = I - EOQ - D(v-g)/(vr)
	it('agrees with the disposal rule: 43.299 of the second', () => {
		const lot = Math.sqrt((2 * 12 * 10) / (0.25 * 40));
		expect(lot + (12 * (40 - 8)) / (40 * 0.25)).toBeCloseTo(43.299, 3);
		expect(12 * 3.608248).toBeCloseTo(43.299, 3);
	});

	it('is the newsvendor for calls counted until it dies out', () => {
		fc.assert(
			fc.property(
				fc.double({ min: 0.1, max: 20, noNaN: true }),
				fc.double({ min: 0.05, max: 2, noNaN: true }),
				fc.double({ min: 0.05, max: 0.95, noNaN: true }),
				(calls, dying, ratio) => {
					const unit = { ...plain, callsPerYear: calls, moneyRate: 0, dyingRate: dying };
					// each unit costs so much before anybody calls: the critical share of its price
					const cost = { ...unit, labourNow: 1, minutesNow: ratio * unit.usedCents };
					let keep = 0;
					let chance = calls / (calls + dying);
					while (chance > ratio + 1e-9) {
						keep += 1;
						chance *= calls / (calls + dying);
					}
					fc.pre(Math.abs(chance - ratio) > 1e-7);
					expect(gain(cost).keepUpTo).toBe(keep);
				}
			),
			{ numRuns: 60 }
		);
	});
});

describe('the reach and the shelf, by adding up the years', () => {
	it.each([
		[0.6, 0.1, 0.16, 1],
		[1.5, 0.095, 0.113, 3],
		[3.4, 0.02, 0.15, 2],
		[2, 0.3, 0.36, 5]
	])('come to the same: calls %d, money %d, dying %d, place %i', (calls, money, dying, place) => {
		const part = {
			...plain,
			...{ callsPerYear: calls, moneyRate: money, dyingRate: dying, place },
			...{ shelfCents: 150, scrapCents: 60, chanceGood: 0.7, labour: 50, minutesLater: 9 }
		};
		let reached = 0;
		let held = 0;
		const step = 0.002;
		for (let at = step / 2; at * (money + dying) < 36; at += step) {
			const alive = Math.exp(-(money + dying + calls) * at) * step;
			let sofar = 1;
			let fewer = 0;
			for (let k = 0; k < place; k += 1) {
				fewer += sofar;
				if (k === place - 1) reached += alive * calls * sofar;
				sofar *= (calls * at) / (k + 1);
			}
			held += alive * fewer;
		}
		const { terms } = gain(part);
		expect(terms.reach).toBeCloseTo(reached, 5);
		const answered = 0.7 * part.usedCents + 0.3 * 60 - 450;
		const life = reached * answered + held * (60 * dying - 150);
		expect(Math.abs(terms.whenCalled - life)).toBeLessThan(0.02);
	});
});

describe('Poisson demand, against published tables', () => {
	const newsvendor = (mean: number, over: number, under: number) => {
		let best = 0;
		while (atMost(best, mean) < under / (under + over)) best += 1;
		return best;
	};
	const cost = (stock: number, mean: number, over: number, under: number) => {
		let sum = 0;
		for (let calls = 0; calls < mean + 40 * Math.sqrt(mean); calls += 1)
			sum +=
				exactly(calls, mean) * (calls > stock ? (calls - stock) * under : (stock - calls) * over);
		return sum;
	};

	// Snyder and Shen 2019, Fundamentals of Supply Chain Theory, example 4.7, problem 4.8, section 4.4
	it.each([
		[6, 1, 4, 8, 3.570107, 5, 6.590296],
		[18, 200, 270, 19, 786.0884, 13, 1445.7511],
		[90, 0.08, 1.25, 105, 1.5450189, null, null]
	])('newsvendor, mean %d', (mean, over, under, stock, best, other, worse) => {
		expect(newsvendor(mean, over, under)).toBe(stock);
		expect(cost(stock, mean, over, under) / best).toBeCloseTo(1, 6);
		if (other !== null && worse !== null)
			expect(cost(other, mean, over, under) / worse).toBeCloseTo(1, 6);
	});

	// the same, example 4.3, normal demand
	it('newsvendor, normal', () => {
		const z = Math.sqrt(2 * gammaQuantile(2 * (0.7 / 0.88) - 1, 0.5, 1));
		expect(50 + 8 * z).toBeCloseTo(56.603956, 5);
		expect((0.88 * 8 * Math.exp((-z * z) / 2)) / Math.sqrt(2 * Math.PI)).toBeCloseTo(1.997605, 5);
	});

	// OpenStax 2017, Introductory Business Statistics; last: a printed appendix table
	it('single chances', () => {
		expect([exactly(160, 147), atMost(160, 147)].map((x) => x.toFixed(4))).toEqual([
			...['0.0180', '0.8666']
		]);
		const before = (years: number, rate: number) => gammaBelow(years * rate, 1);
		const told = [atMost(4, 4), 1 - atMost(3, 3), before(5, 0.25) - 0, before(4, 0.25)];
		expect([...told, 1 - before(7, 0.1)].map((x) => x.toFixed(4))).toEqual([
			...['0.6288', '0.3528', '0.7135', '0.6321', '0.4966']
		]);
		const table = [
			[0.1, 0],
			[0.5, 1],
			[1.5, 3],
			[2, 2],
			[2.5, 4]
		] as const;
		expect(table.map(([mean, calls]) => exactly(calls, mean).toFixed(4))).toEqual([
			...['0.9048', '0.3033', '0.1255', '0.2707', '0.1336']
		]);
	});

	// computed with SciPy 1.x, anchored on the printed entries above
	it.each([
		[0.1, '.9048 .9953 .9998 1.0000'],
		[0.5, '.6065 .9098 .9856 .9982 .9998 1.0000'],
		[1, '.3679 .7358 .9197 .9810 .9963 .9994 .9999 1.0000'],
		[1.5, '.2231 .5578 .8088 .9344 .9814 .9955 .9991 .9998 1.0000'],
		[2, '.1353 .4060 .6767 .8571 .9473 .9834 .9955 .9989 .9998'],
		[2.5, '.0821 .2873 .5438 .7576 .8912 .9580 .9858 .9958 .9989'],
		[3, '.0498 .1991 .4232 .6472 .8153 .9161 .9665 .9881 .9962'],
		[4, '.0183 .0916 .2381 .4335 .6288 .7851 .8893 .9489 .9786'],
		[5, '.0067 .0404 .1247 .2650 .4405 .6160 .7622 .8666 .9319'],
		[6, '.0025 .0174 .0620 .1512 .2851 .4457 .6063 .7440 .8472']
	])('table of at most k, mean %d', (mean, row) => {
		row
			.split(' ')
			.forEach((value, k) =>
				expect(Math.abs(atMost(k, mean) - Number(value))).toBeLessThan(5.1e-5)
			);
	});

	// Sherbrooke 1968, "METRIC": expected backorders, from memory
	it.each([
		[1, [1, 0.3679, 0.1036, 0.0233, 0.0043]],
		[2.5, [2.5, 1.5821, 0.8694, 0.4132, 0.1708]]
	])('backorders, mean %d', (mean, rows) => {
		rows.forEach((value, stock) => expect(cost(stock, mean, 0, 1)).toBeCloseTo(value, 4));
	});
});
