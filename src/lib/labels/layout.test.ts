import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Label } from './label';
import { layOut, PRINTER_DOT, type Size } from './layout';
import type { Box, Piece } from './piece';
import { CODE_LEAST, type Face } from './row';
import { STOCKS } from './stocks';

/** About as wide as the real faces: a narrow one, and the fixed one exactly. */
const measure = (text: string, face: Face) =>
	[...text].length * (face === 'code' ? 0.602 : face === 'bold' ? 0.66 : 0.55);

const ADDRESS = 'HTTPS://ENDPLAY.EXAMPLE/T/OSIERGATE/K7M3X';
const part: Label = {
	...{ what: 'part', code: 'K7M3X', name: 'Carburetor, float bowl', engine: 'Ondrake TARN-21L' },
	...{
		donor: 'D12',
		number: '',
		grade: 'good used',
		bin: 'K3-1',
		caution: '',
		foot: 'Osiergate, 3 March 2026'
	}
};

const words = fc
	.array(fc.string({ unit: 'grapheme', maxLength: 24 }), { maxLength: 14 })
	.map((list) => list.join(' '));
const code = fc.constantFrom('K7M3X', 'W0W0W', '00000');
const labels: fc.Arbitrary<Label> = fc.oneof(
	fc.record({
		...{ what: fc.constant('part' as const), code, name: words, engine: words, foot: words },
		...{
			donor: fc.option(words),
			grade: words,
			number: words,
			bin: fc.option(words),
			caution: words
		}
	}),
	fc.record({
		...{ what: fc.constant('box' as const), code, number: words, engine: words, foot: words },
		...{ cause: words, caution: words }
	}),
	fc.record({
		...{ what: fc.constant('bin' as const), code, address: words, purpose: words, foot: words },
		...{ place: words, caution: words }
	}),
	fc.record({ what: fc.constant('blank' as const), code, foot: words })
);
const sizes: fc.Arbitrary<Size> = fc.oneof(
	fc.constantFrom(...STOCKS.map(({ measures: { width, height } }) => ({ width, height }))),
	fc.record({
		width: fc.double({ min: 38, max: 300, noNaN: true }),
		height: fc.double({ min: 19, max: 300, noNaN: true })
	})
);
const addresses = fc
	.string({ unit: fc.constantFrom(...'ABCDEFGHIJ0123456789-.'), minLength: 8, maxLength: 90 })
	.map((rest) => `HTTPS://${rest}/T/S/K7M3X`);

const inside = (box: Box, size: Size) =>
	box.x >= -1e-6 &&
	box.y >= -1e-6 &&
	box.x + box.width <= size.width + 1e-6 &&
	box.y + box.height <= size.height + 1e-6;

const over = (a: Box, b: Box) =>
	a.x + a.width > b.x + 1e-6 &&
	b.x + b.width > a.x + 1e-6 &&
	a.y + a.height > b.y + 1e-6 &&
	b.y + b.height > a.y + 1e-6;

const pairs = <T>(list: T[]) =>
	list.flatMap((a, at) => list.slice(at + 1).map((b) => [a, b] as const));
const solid = (pieces: Piece[]) => pieces.filter((piece) => piece.what !== 'frame');
const anyLabel = (holds: (pieces: Piece[], size: Size, label: Label) => void) =>
	fc.assert(
		fc.property(labels, addresses, sizes, (label, address, size) =>
			holds(layOut(label, address, size, measure), size, label)
		),
		{ numRuns: 120 }
	);

describe('whatever is printed on whatever stock', { timeout: 30_000 }, () => {
	it('nothing leaves the label and nothing lies over anything else, the quiet zone included', () => {
		anyLabel((pieces, size) => {
			for (const piece of pieces) expect(inside(piece, size), piece.what).toBe(true);
			for (const [a, b] of pairs(solid(pieces)))
				expect(over(a, b), `${a.what} ${b.what}`).toBe(false);
			const qr = pieces.find((piece) => piece.what === 'qr')!;
			for (const frame of pieces.filter((piece) => piece.what === 'frame'))
				expect(over(frame, qr)).toBe(false);
		});
	});

	it('the code is there in letters of 4 mm or more, and to scan in whole dots of the printer', () => {
		anyLabel((pieces, _, label) => {
			const said = pieces.find((piece) => piece.what === 'text' && piece.face === 'code');
			expect(said).toMatchObject({ text: label.code });
			expect(said?.what === 'text' && said.size * 0.729).toBeGreaterThanOrEqual(4);
			const qr = pieces.find((piece) => piece.what === 'qr')!;
			const dots = qr.what === 'qr' ? qr.dot / PRINTER_DOT : 0;
			expect(dots).toBeGreaterThanOrEqual(2);
			expect(dots).toBe(Math.round(dots));
			for (const at of [qr.x, qr.y])
				expect(at / PRINTER_DOT).toBeCloseTo(Math.round(at / PRINTER_DOT), 6);
		});
	});

	it('no line of letters is wider than its place', () => {
		anyLabel((pieces) => {
			for (const piece of pieces)
				if (piece.what === 'text' && [...piece.text].length > 2)
					expect(measure(piece.text, piece.face) * piece.size).toBeLessThanOrEqual(
						piece.width + 1e-6
					);
		});
	});
});

const texts = (pieces: Piece[]) =>
	pieces.flatMap((piece) => (piece.what === 'text' ? [piece.text] : [])).join(' ');

describe.each(STOCKS)('on $said', ({ measures }) => {
	it('an everyday part tag says all of it', () => {
		const said = texts(layOut(part, ADDRESS, measures, measure));
		for (const word of ['K7M3X', 'Carburetor', 'TARN-21L', 'D12', 'good used', 'K3-1'])
			expect(said).toContain(word);
	});

	it('one with a caution says all of it too', () => {
		const label = { ...part, what: 'part', caution: 'Test before fitting' } as Label;
		const said = texts(layOut(label, ADDRESS, measures, measure));
		for (const word of ['Carburetor', 'TARN-21L', 'D12', 'good used', 'K3-1', 'Test before'])
			expect(said).toContain(word);
	});

	it('a bin sign shows its address largest, above 8 mm letters', () => {
		const sign: Label = {
			...{ what: 'bin', code: 'K7M3X', address: 'K3-1', purpose: 'float carburetors', place: '' },
			...{ caution: '', foot: 'Osiergate' }
		};
		const sizes = layOut(sign, ADDRESS, measures, measure).flatMap((piece) =>
			piece.what === 'text' ? [[piece.text, piece.size] as const] : []
		);
		const [largest] = sizes.toSorted(([, a], [, b]) => b - a);
		expect(largest![0]).toBe('K3-1');
		expect(largest![1]).toBeGreaterThan(8);
	});

	it('a blank tag has a line to write on', () => {
		const pieces = layOut({ what: 'blank', code: 'K7M3X', foot: '' }, ADDRESS, measures, measure);
		expect(pieces.filter((piece) => piece.what === 'line').length).toBeGreaterThan(0);
		expect(CODE_LEAST).toBeGreaterThan(5.48);
	});
});
