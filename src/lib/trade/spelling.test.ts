import fc from 'fast-check';
import { expect, it } from 'vitest';
import { editsBetween, lettersOf, mayBeNear } from './spelling';

const word = fc.string({ unit: fc.constantFrom(...'abcdeö'), maxLength: 9 });

/** The whole table, without any short cut. */
function slowly(a: string, b: string): number {
	const rows = Array.from({ length: a.length + 1 }, (_a, i) =>
		Array.from({ length: b.length + 1 }, (_b, j) => (i === 0 ? j : j === 0 ? i : 0))
	);
	const at = (i: number, j: number) => rows[i]![j]!;
	for (let i = 1; i <= a.length; i += 1)
		for (let j = 1; j <= b.length; j += 1) {
			const differs = a[i - 1] === b[j - 1] ? 0 : 1;
			let least = Math.min(at(i - 1, j) + 1, at(i, j - 1) + 1, at(i - 1, j - 1) + differs);
			if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1])
				least = Math.min(least, at(i - 2, j - 2) + 1);
			rows[i]![j] = least;
		}
	return at(a.length, b.length);
}

it('counts edits as the whole table does, up to the most that matters', () => {
	fc.assert(
		fc.property(word, word, fc.integer({ min: 0, max: 4 }), (a, b, most) => {
			expect(editsBetween(a, b, most)).toBe(Math.min(slowly(a, b), most + 1));
		}),
		{ numRuns: 2000 }
	);
});

it('counts words of any length, one after the other', () => {
	expect(editsBetween('x'.repeat(300), `${'x'.repeat(299)}y`, 2)).toBe(1);
	expect(editsBetween('carb', 'crab', 1)).toBe(1);
	expect(editsBetween('', '', 0)).toBe(0);
});

it('passes over no word that is near, by the letters alone', () => {
	fc.assert(
		fc.property(word, word, fc.integer({ min: 0, max: 4 }), (a, b, most) => {
			if (slowly(a, b) <= most) expect(mayBeNear(lettersOf(a), lettersOf(b), most)).toBe(true);
		}),
		{ numRuns: 2000 }
	);
	expect(mayBeNear(lettersOf('carburetor'), lettersOf('muffler'), 2)).toBe(false);
});
