import { WorthError } from './worth-error';

/** What a figure is: its unit in words and the range it must lie in (0 and 1e12 unless told). */
export interface Figure {
	unit: string;
	least?: number;
	most?: number;
	whole?: boolean;
	optional?: boolean;
}

export const share = (unit: string): Figure => ({ unit, most: 1 });
export const amount = (unit: string): Figure => ({ unit });

// Far above any shop, and low enough that no product of figures runs over to infinity.
const MOST = 1e12;

function rangeOf(figure: Figure): string {
	const least = figure.least ?? 0;
	if (figure.most !== undefined) return `from ${least} to ${figure.most}`;
	return `${figure.whole ? 'a whole number, ' : ''}${least} or more, at most ${MOST}`;
}

function fits(value: unknown, figure: Figure): boolean {
	if (typeof value !== 'number' || !Number.isFinite(value)) return false;
	if (figure.whole && !Number.isInteger(value)) return false;
	return value >= (figure.least ?? 0) && value <= (figure.most ?? MOST);
}

/** Refuses the first figure that is missing, not a finite number or out of its range. */
export function check<Input extends object>(
	input: Input,
	figures: { [Field in keyof Input]?: Figure }
): void {
	if (typeof input !== 'object' || input === null) {
		throw new WorthError('input', 'input: an object with the figures is needed');
	}
	for (const field in figures) {
		const figure = figures[field];
		const value: unknown = input[field];
		if (!figure || (figure.optional && (value === undefined || value === null))) continue;
		if (!fits(value, figure)) {
			throw new WorthError(field, `${field}: ${figure.unit}, ${rangeOf(figure)}`);
		}
	}
}
