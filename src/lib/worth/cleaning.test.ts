import { describe, expect, it } from 'vitest';
import { keepCleaning, verdictWord, WorthError } from './index';

const gummed = { alpha: 2.4, beta: 1.6, failures: 0, worthCents: 5200, attemptCents: 2200 };

describe('when to stop cleaning', () => {
	it.each([
		[0, true, 920],
		[1, true, 296],
		[2, false, -120]
	])('after %i failures: %s with %i cents in hand', (failures, go, inHandCents) => {
		expect(keepCleaning({ ...gummed, failures })).toEqual({ go, inHandCents, stopAfter: 2 });
	});

	it('never starts where it cannot pay and never stops where it costs nothing', () => {
		expect(keepCleaning({ ...gummed, worthCents: 0 })).toMatchObject({ go: false, stopAfter: 0 });
		expect(keepCleaning({ ...gummed, attemptCents: 0 })).toMatchObject({
			go: true,
			stopAfter: null
		});
	});

	it('stops at the same count as trying one after the other', () => {
		for (const attemptCents of [100, 312, 520, 1040, 2080, 3119, 3120, 3121]) {
			let failures = 0;
			while (keepCleaning({ ...gummed, attemptCents, failures }).go) failures += 1;
			expect(keepCleaning({ ...gummed, attemptCents }).stopAfter).toBe(failures);
		}
	});

	it('refuses weights of nil and broken counts', () => {
		expect(() => keepCleaning({ ...gummed, alpha: 0 })).toThrow(WorthError);
		expect(() => keepCleaning({ ...gummed, failures: 0.5 })).toThrow(
			expect.objectContaining({ field: 'failures' })
		);
	});
});

describe('the word of a verdict', () => {
	it.each([
		[500, 'keep'],
		[499, 'close call'],
		[1, 'close call'],
		[0, 'let it go'],
		[-1, 'let it go']
	])('%i cents against a margin of 500: %s', (gainCents, word) => {
		expect(verdictWord({ gainCents, marginCents: 500 })).toBe(word);
	});

	it('refuses what is not a figure', () => {
		expect(() => verdictWord({ gainCents: NaN, marginCents: 500 })).toThrow(WorthError);
		expect(() => verdictWord({ gainCents: 1, marginCents: -1 })).toThrow(WorthError);
	});
});
