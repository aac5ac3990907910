import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
	apart,
	held,
	MOST_ZOOM,
	onPicture,
	pan,
	pinch,
	showing,
	toPicture,
	toStage,
	WHOLE,
	zoomAt,
	type Point,
	type View
} from './geometry';

const share = fc.double({ min: 0, max: 1, noNaN: true });
const point: fc.Arbitrary<Point> = fc.record({ x: share, y: share });
const view: fc.Arbitrary<View> = fc
	.record({ zoom: fc.double({ min: 1, max: MOST_ZOOM, noNaN: true }), at: point })
	.map(({ zoom, at }) => ({ zoom, x: at.x * (1 - zoom), y: at.y * (1 - zoom) }));
const tall = fc.double({ min: 0.3, max: 3, noNaN: true });

const near = (a: Point, b: Point) => {
	expect(a.x).toBeCloseTo(b.x, 9);
	expect(a.y).toBeCloseTo(b.y, 9);
};
const covers = ({ zoom, x, y }: View) => {
	expect(zoom).toBeGreaterThanOrEqual(1);
	expect(zoom).toBeLessThanOrEqual(MOST_ZOOM);
	for (const at of [x, y]) {
		expect(at).toBeLessThanOrEqual(0);
		expect(at).toBeGreaterThanOrEqual(1 - zoom - 1e-9);
	}
};

describe('zoom', () => {
	it('keeps the point under the finger when the picture grows', () => {
		fc.assert(
			fc.property(view, point, fc.double({ min: 1, max: 20, noNaN: true }), (before, at, by) => {
				near(toPicture(zoomAt(before, at, by), at), toPicture(before, at));
			})
		);
	});

	it('never shows what lies beside the picture', () => {
		fc.assert(
			fc.property(view, point, fc.double({ min: 0.01, max: 50, noNaN: true }), (before, at, by) => {
				covers(zoomAt(before, at, by));
			})
		);
	});

	it('goes back to the whole', () => {
		fc.assert(
			fc.property(view, point, (before, at) => {
				const whole = zoomAt(before, at, 1 / MOST_ZOOM);
				expect(whole.zoom).toBe(1);
				near(whole, WHOLE);
			})
		);
	});

	it('in and out about one point is where it was', () => {
		fc.assert(
			fc.property(view, point, fc.double({ min: 1, max: 3, noNaN: true }), (before, at, by) => {
				fc.pre(before.zoom * by <= MOST_ZOOM);
				near(zoomAt(zoomAt(before, at, by), at, 1 / by), before);
			})
		);
	});
});

describe('two fingers', () => {
	it('keep under their middle what lay there, and grow by what they went apart', () => {
		fc.assert(
			fc.property(
				view,
				point,
				point,
				tall,
				fc.double({ min: 1, max: 4, noNaN: true }),
				(v, a, b, t, by) => {
					const gap = apart(a, b, t);
					fc.pre(gap > 0.01 && v.zoom * by <= MOST_ZOOM);
					const mid = { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 };
					const out = (p: Point) => ({
						x: mid.x + (p.x - mid.x) * by,
						y: mid.y + (p.y - mid.y) * by
					});
					const after = pinch(v, [a, b], [out(a), out(b)], t);
					expect(after.zoom / v.zoom).toBeCloseTo(by, 6);
					near(toPicture(after, mid), toPicture(v, mid));
				}
			)
		);
	});

	it('that stay as far apart push the picture as one finger does', () => {
		fc.assert(
			fc.property(view, point, point, tall, point, (v, a, b, t, by) => {
				fc.pre(apart(a, b, t) > 0.01);
				const moved = (p: Point) => ({ x: p.x + by.x, y: p.y + by.y });
				const after = pinch(v, [a, b], [moved(a), moved(b)], t);
				near(after, pan(v, by));
				covers(after);
			})
		);
	});

	it('on one spot change nothing', () => {
		const at = { x: 0.4, y: 0.4 };
		near(pinch({ zoom: 2, x: -0.5, y: -0.5 }, [at, at], [at, at], 1), { x: -0.5, y: -0.5 });
	});
});

describe('places', () => {
	it('on the stage and on the picture are each other', () => {
		fc.assert(fc.property(view, point, (v, at) => near(toPicture(v, toStage(v, at)), at)));
	});

	it('beside the picture are moved onto it', () => {
		expect(onPicture({ x: -0.2, y: 1.4 })).toEqual({ x: 0, y: 1 });
	});

	it('can be brought into sight', () => {
		fc.assert(
			fc.property(view, point, (v, at) => {
				const after = showing(v, at);
				covers(after);
				const seen = toStage(after, at);
				for (const side of [seen.x, seen.y]) {
					expect(side).toBeGreaterThanOrEqual(-1e-9);
					expect(side).toBeLessThanOrEqual(1 + 1e-9);
				}
			})
		);
	});

	it('a view from anywhere is held on the picture', () => covers(held({ zoom: 99, x: 5, y: -99 })));
});
