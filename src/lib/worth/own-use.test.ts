import { expect, it } from 'vitest';
import { gain, ownUse, WorthError } from './index';

it('saves its share of the new price, and the day', () => {
	expect(ownUse({ newCents: 9650, share: 0.9 })).toEqual({ usedCents: 8685 });
	expect(ownUse({ newCents: 9650, share: 0.9, leavesTodayCents: 1500 }).usedCents).toBe(10_185);
});

it('makes a part worth more to the shop than over the counter', () => {
	const part = {
		...{ usedCents: 4300, chanceGood: 0.9, comeBack: 0.05, comeBackCents: 1700 },
		...{ callsPerYear: 0.8, place: 1, moneyRate: 0.1, dyingRate: 0.16, shelfCents: 80 },
		...{ scrapCents: 30, labourNow: 57, labour: 57, minutesNow: 4, minutesLater: 20 }
	};
	const { usedCents } = ownUse({ newCents: 9600, share: 0.9 });
	expect(gain({ ...part, usedCents }).gainCents).toBeGreaterThan(gain(part).gainCents);
});

it('refuses what is no figure, by name', () => {
	expect(() => ownUse({ newCents: 1, share: 1.1 })).toThrow(WorthError);
	expect(() => ownUse({ newCents: -1, share: 1 })).toThrow(
		expect.objectContaining({ field: 'newCents' })
	);
});
