import { describe, expect, it } from 'vitest';
import { pulledOnCall, WorthError, type ParkedInput } from './index';

const part: ParkedInput = {
	...{ usedCents: 4600, chanceGood: 0.6, comeBack: 0.08, comeBackCents: 3900, callsPerYear: 1.5 },
	...{ place: 1, moneyRate: Math.log(1.1), dyingRate: Math.log(1.12), shelfCents: 150 },
	...{ scrapCents: 20, labourNow: 3400 / 60, labour: 3400 / 60, minutesNow: 9, minutesLater: 14 },
	minutesAlone: 9
};

describe('a part that waits on its parked donor', () => {
	it('is worth the chance of the call times what is then in hand', () => {
		const reach = 1.5 / (1.5 + Math.log(1.1) + Math.log(1.12));
		const sale = 0.92 * 4600 - 0.08 * 3900;
		const inHand = 0.6 * sale + 0.4 * 20 - (23 * 3400) / 60;
		expect(pulledOnCall(part).cents).toBe(Math.round(reach * inHand));
	});

	it('is left on it where pulling would cost more than it brings', () => {
		expect(pulledOnCall({ ...part, minutesAlone: 90 }).cents).toBe(0);
	});

	it('pays nothing before the call: neither the rush nor the shelf counts', () => {
		const dear = { ...part, labourNow: 500, minutesNow: 90, shelfCents: 9000 };
		expect(pulledOnCall(dear)).toEqual(pulledOnCall(part));
	});

	it('names a broken figure', () => {
		expect(() => pulledOnCall({ ...part, minutesAlone: -1 })).toThrow(WorthError);
		expect(() => pulledOnCall({ ...part, chanceGood: 2 })).toThrow(/chanceGood/);
	});
});
