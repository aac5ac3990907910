/** A figure that the calculation cannot take: names the field, its unit and its range. */
export class WorthError extends Error {
	readonly field: string;

	constructor(field: string, message: string) {
		super(message);
		this.name = 'WorthError';
		this.field = field;
	}
}
