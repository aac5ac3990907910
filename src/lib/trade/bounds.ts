import type { TestField } from './bench-tests.data';

export type { TestField };

/** The bounds of a field in words, such as "2 to 5 ohm"; '' where nothing is usual. */
export function boundsSaid({ least, most, unit }: TestField): string {
	if (least !== undefined && least === most) return `${least} ${unit}`;
	if (least !== undefined && most !== undefined) return `${least} to ${most} ${unit}`;
	if (least !== undefined) return `${least} ${unit} or more`;
	return most === undefined ? '' : `${most} ${unit} or less`;
}

/** The figures that lie outside their bounds, each in words; a figure on the bound is inside. */
export function outside(
	fields: readonly TestField[],
	figures: Readonly<Record<string, number | undefined>>
): string[] {
	return fields.flatMap((field) => {
		const value = figures[field.id];
		const { least = -Infinity, most = Infinity } = field;
		if (value === undefined || (value >= least && value <= most)) return [];
		return [`${field.said}: ${value} ${field.unit}, usual is ${boundsSaid(field)}`];
	});
}
