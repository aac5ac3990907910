import { expect, it } from 'vitest';
import { comesIn } from './coming';

it.each([
	[null, 'pulled', true],
	[null, 'shelved', true],
	[null, 'scrapped', false],
	['pulled', 'shelved', false],
	['shelved', 'shelved', false],
	['held', 'shelved', true],
	['missing', 'shelved', true],
	['out', 'back', true],
	['back', 'shelved', true],
	['back', 'back', false],
	['shelved', 'held', false],
	['held', 'out', false]
] as const)('a part from %s to %s comes in: %s', (from, to, comes) =>
	expect(comesIn(from, to)).toBe(comes)
);
