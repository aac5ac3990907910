import { describe, expect, it } from 'vitest';
import { breakEven } from './break-even';
import { gainFigures } from './gain-input';
import { gain, WorthError, type GainInput } from './index';

const one: GainInput = {
	usedCents: 4600,
	chanceGood: 0.6,
	comeBack: 0.08,
	comeBackCents: 3900,
	callsPerYear: 1.5,
	place: 1,
	moneyRate: Math.log(1.1),
	dyingRate: Math.log(1.12),
	shelfCents: 150,
	scrapCents: 20,
	labourNow: 3400 / 60,
	labour: 3400 / 60,
	minutesNow: 9,
	minutesLater: 14
};
const two = { ...one, usedCents: 6000, chanceGood: 0.95, callsPerYear: 4, minutesLater: 8 };

const at = (part: GainInput, place: number) => gain({ ...part, place }).terms;
const underA = (part: GainInput, place: number) => at(part, place).whenCalled - part.scrapCents;
const underB = (part: GainInput, place: number) => at(part, place).now - part.scrapCents;
const largest = (part: GainInput, under: typeof underA) => {
	let place = 0;
	while (under(part, place + 1) > 0) place += 1;
	return place;
};

describe('worked case 1, checked by a simulation of three million lives', () => {
	it('has the terms', () => {
		const { terms, gainCents, timing, keepUpTo } = gain(one);
		expect(terms.sale).toBeCloseTo(3920, 6);
		expect(terms.shelf).toBeCloseTo(708.08201, 4);
		expect(terms.reach).toBeCloseTo(0.8778918, 7);
		expect(terms.whenCalled).toBeCloseTo(778.90114, 4);
		expect(terms.now).toBeCloseTo(717.59053, 4);
		expect([gainCents, timing, keepUpTo]).toEqual([759, 'when-called', 4]);
	});

	it('falls with its place in the queue', () => {
		[758.9, 515.05, 300.98, 113.05, -51.94].forEach((cents, index) =>
			expect(underA(one, index + 1)).toBeCloseTo(cents, 1)
		);
		[697.59, 399.92, 138.59, -90.82, -292.22].forEach((cents, index) =>
			expect(underB(one, index + 1)).toBeCloseTo(cents, 1)
		);
		expect([largest(one, underA), largest(one, underB)]).toEqual([4, 3]);
	});

	it('breaks even', () => {
		const even = breakEven(gainFigures(one));
		expect(even?.whenCalled).toBeCloseTo(3033.95172, 4);
		expect(even?.now).toBeCloseTo(3160.47066, 4);
		expect(gain(one).breakEvenUsedCents).toBe(3034);
	});

	it('says the wait, the chance of a call and the gain per minute', () => {
		const told = gain({ ...one, place: 2 });
		expect(told.waitYears).toBeCloseTo(2 / 1.5, 12);
		expect(told.everCalled).toBeCloseTo((1.5 / (1.5 + Math.log(1.12))) ** 2, 12);
		expect(gain(one).gainPerMinute).toBeCloseTo(758.90114 / 9, 4);
	});
});

describe('worked case 2', () => {
	it('has the terms', () => {
		const { terms, keepUpTo } = gain(two);
		expect(terms.sale).toBeCloseTo(5208, 6);
		expect(terms.whenCalled).toBeCloseTo(3727.3161, 4);
		expect(terms.now).toBeCloseTo(3706.64727, 4);
		expect(keepUpTo).toBe(28);
		expect([largest(two, underA), largest(two, underB)]).toEqual([28, 24]);
		const even = breakEven(gainFigures(two));
		expect(even?.whenCalled).toBeCloseTo(1536.96949, 4);
		expect(even?.now).toBeCloseTo(1561.85155, 4);
	});
});

// Rosenfield 1985, "Salvaging of Excess Inventory", MIT Sloan working paper 1660-85
describe('the published form, without bad parts and work', () => {
	const plain: GainInput = {
		...one,
		...{ usedCents: 6000, chanceGood: 1, comeBack: 0, callsPerYear: 0.5, scrapCents: 500 },
		...{ moneyRate: 0.2, dyingRate: 0, shelfCents: 0, minutesNow: 0, minutesLater: 0 }
	};

	it('gives the values of the 1st, 2nd ... unit and keeps 7', () => {
		const values = [42.8571, 30.6122, 21.8659, 15.6185, 11.1561, 7.9686, 5.6919, 4.0656];
		values.forEach((value, index) =>
			expect(at(plain, index + 1).whenCalled / 100).toBeCloseTo(value, 4)
		);
		expect(gain(plain).keepUpTo).toBe(7);
	});

	it('keeps 3 with a shelf cost of 3 a year', () => {
		const shelved = { ...plain, shelfCents: 300 };
		[33.5714, 18.2653, 7.3324, -0.4769].forEach((margin, index) =>
			expect(underA(shelved, index + 1) / 100).toBeCloseTo(margin, 4)
		);
		expect(gain(shelved).keepUpTo).toBe(3);
	});

	it('keeps 16 of a quick seller', () => {
		const quick = { ...plain, usedCents: 4000, scrapCents: 600, callsPerYear: 2, moneyRate: 0.25 };
		expect(at(quick, 16).whenCalled / 100).toBeCloseTo(6.076, 4);
		expect(at(quick, 17).whenCalled / 100).toBeCloseTo(5.4009, 4);
		expect(gain(quick).keepUpTo).toBe(16);
	});
});

describe('the edges', () => {
	it('nobody calls: no reach, no wait, no break-even', () => {
		const told = gain({ ...one, callsPerYear: 0 });
		expect(told.terms.reach).toBe(0);
		expect(told).toMatchObject({
			...{ waitYears: null, breakEvenUsedCents: null, everCalled: 0, keepUpTo: 0 }
		});
		expect(told.gainCents).toBeLessThan(0);
	});

	it('neither money nor time wears: the shelf term is its limit', () => {
		const still = { ...one, moneyRate: 0, dyingRate: 0 };
		const { terms } = gain({ ...still, place: 3 });
		expect([terms.reach, terms.shelf]).toEqual([1, null]);
		expect(terms.shelfCost).toBeCloseTo((150 * 3) / 1.5, 9);
		expect(gain({ ...still, shelfCents: 0 }).keepUpTo).toBeNull();
		const nearly = gain({ ...still, place: 3, dyingRate: 1e-9 });
		expect(nearly.terms.whenCalled).toBeCloseTo(terms.whenCalled, 2);
		expect(() => gain({ ...still, callsPerYear: 0 })).toThrow(
			expect.objectContaining({ field: 'callsPerYear' })
		);
	});

	it('never good, or always back: no price helps', () => {
		expect(gain({ ...one, chanceGood: 0 })).toMatchObject({
			breakEvenUsedCents: null,
			keepUpTo: 0
		});
		expect(gain({ ...one, comeBack: 1 }).breakEvenUsedCents).toBeNull();
	});

	it('nothing to spend now: no gain per minute', () => {
		expect(gain({ ...one, minutesNow: 0 }).gainPerMinute).toBeNull();
	});

	it('a waiting customer counts for the first unit only', () => {
		const wanted = { ...one, waiting: 0.7 };
		expect(gain(wanted).terms.reach).toBeCloseTo(0.7 + 0.3 * 0.8778918, 7);
		expect(gain({ ...wanted, place: 2 }).terms).toEqual(gain({ ...one, place: 2 }).terms);
		expect(gain({ ...wanted, waiting: 1 })).toMatchObject({ waitYears: 0, everCalled: 1 });
		const unasked = { ...one, callsPerYear: 0 };
		expect(gain({ ...unasked, waiting: 1 })).toMatchObject({ keepUpTo: 1, everCalled: 1 });
		expect(gain({ ...unasked, waiting: 0.5 }).waitYears).toBeNull();
	});

	it('cleaning that does not keep is done when called, whatever now would bring', () => {
		const slow = { ...one, labourNow: 5, chanceGood: 0.9, minutesLater: 25 };
		const free = gain(slow);
		expect(free.timing).toBe('now');
		const forced = gain({ ...slow, workWhenCalledOnly: true });
		expect(forced.timing).toBe('when-called');
		expect(forced.terms).toEqual(free.terms);
		expect(forced.gainCents).toBe(Math.round(free.terms.whenCalled - 20));
		expect(forced.keepUpTo).toBe(largest(slow, underA));
		expect(forced.breakEvenUsedCents).toBe(Math.round(breakEven(gainFigures(slow))!.whenCalled));
		expect(() => gain({ ...one, workWhenCalledOnly: 1 as never })).toThrow(
			expect.objectContaining({ field: 'workWhenCalledOnly' })
		);
	});

	it('ties go to the work that can wait', () => {
		const proven = { ...one, chanceGood: 1, minutesLater: 0 };
		expect(gain(proven).timing).toBe('when-called');
	});

	it.each([
		['usedCents', -1],
		['chanceGood', 1.2],
		['comeBack', NaN],
		['comeBackCents', Infinity],
		['kitCents', -1],
		['callsPerYear', undefined],
		['place', 0],
		['place', 1.5],
		['moneyRate', -0.1],
		['dyingRate', null],
		['shelfCents', '150'],
		['scrapCents', -20],
		['labourNow', -1],
		['labour', NaN],
		['minutesNow', -1],
		['minutesLater', 1e13],
		['waiting', 2]
	])('refuses %s %s by name, unit and range', (field, value) => {
		const bad = { ...one, [field]: value } as GainInput;
		expect(() => gain(bad)).toThrow(WorthError);
		expect(() => gain(bad)).toThrow(expect.objectContaining({ field }));
		expect(() => gain(bad)).toThrow(new RegExp(`^${field}: .+, (from|a whole number|0 or more)`));
	});
});
