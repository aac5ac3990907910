/** A point of a picture or of the stage it is shown on: both run from 0 to 1, left to right and down. */
export interface Point {
	x: number;
	y: number;
}

/** How a picture lies on its stage: enlarged `zoom` times, its corner at x and y (0 or less). */
export interface View {
	zoom: number;
	x: number;
	y: number;
}

export const MOST_ZOOM = 12;
/** The whole picture, which fills its stage. */
export const WHOLE: View = { zoom: 1, x: 0, y: 0 };

const within = (value: number, least: number, most: number) =>
	Math.min(most, Math.max(least, value));
const corner = (at: number, zoom: number) => within(at, 1 - zoom, 0);

/** No edge of the picture comes inside the stage, and it is never smaller than that. */
export function held({ zoom, x, y }: View): View {
	const z = within(zoom, 1, MOST_ZOOM);
	return { zoom: z, x: corner(x, z), y: corner(y, z) };
}

/** Where a point of the picture is seen on the stage. */
export const toStage = ({ zoom, x, y }: View, at: Point): Point => ({
	x: x + at.x * zoom,
	y: y + at.y * zoom
});

/** The point of the picture that lies under a point of the stage. */
export const toPicture = ({ zoom, x, y }: View, at: Point): Point => ({
	x: (at.x - x) / zoom,
	y: (at.y - y) / zoom
});

/** The point moved onto the picture, if it was beside it. */
export const onPicture = ({ x, y }: Point): Point => ({ x: within(x, 0, 1), y: within(y, 0, 1) });

/** The view in which this point of the picture is seen at that point of the stage. */
const laidSo = (zoom: number, seen: Point, at: Point): View =>
	held({ zoom, x: at.x - seen.x * zoom, y: at.y - seen.y * zoom });

/**
 * Enlarges by a factor about a point of the stage. What lies there stays there; making the picture smaller, so
 * far as its edges allow.
 */
export function zoomAt(view: View, at: Point, factor: number): View {
	return laidSo(within(view.zoom * factor, 1, MOST_ZOOM), toPicture(view, at), at);
}

/** Pushes the picture by a part of the stage. */
export const pan = ({ zoom, x, y }: View, by: Point): View =>
	held({ zoom, x: x + by.x, y: y + by.y });

type Two = readonly [Point, Point];
const middle = ([a, b]: Two): Point => ({ x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 });

/** How far two points lie apart, in widths of a picture that is `tall` times as high as wide. */
export const apart = (a: Point, b: Point, tall: number): number =>
	Math.hypot(b.x - a.x, (b.y - a.y) * tall);

/** Two fingers moved: what lay between them still does, larger by as much as they went apart. */
export function pinch(view: View, from: Two, to: Two, tall: number): View {
	const before = apart(...from, tall);
	const factor = before > 0 ? apart(...to, tall) / before : 1;
	const zoom = within(view.zoom * factor, 1, MOST_ZOOM);
	return laidSo(zoom, toPicture(view, middle(from)), middle(to));
}

/** The view moved as little as it takes for a point of the picture to be seen, a tenth away from the edge. */
export function showing(view: View, seen: Point): View {
	const at = toStage(view, seen);
	const shift = (place: number) => within(place, 0.1, 0.9) - place;
	return pan(view, { x: shift(at.x), y: shift(at.y) });
}
