/** A place on a picture, in shares of its width and height. */
export interface Spot {
	x: number;
	y: number;
	wide: number;
	high: number;
}

/** A word that was read off a picture, with how sure each of its characters is, 0 to 1. */
export interface SeenWord extends Spot {
	text: string;
	sure: number[];
}

/** What was read off a picture: it was turned clockwise by so many degrees, then looked at more than once. */
export interface SeenText {
	turn: number;
	looks: SeenWord[][];
}

/** The smallest place that holds all of these. */
export function around(spots: readonly Spot[]): Spot {
	const left = Math.min(...spots.map((spot) => spot.x));
	const top = Math.min(...spots.map((spot) => spot.y));
	const right = Math.max(...spots.map((spot) => spot.x + spot.wide));
	const low = Math.max(...spots.map((spot) => spot.y + spot.high));
	return { x: left, y: top, wide: right - left, high: low - top };
}

/** The width and height of a picture after it was turned. */
export function turnedSize(width: number, height: number, turn: number): [number, number] {
	const angle = (turn * Math.PI) / 180;
	const [across, along] = [Math.abs(Math.cos(angle)), Math.abs(Math.sin(angle))];
	return [width * across + height * along, width * along + height * across];
}
