/** Why a verb said no. The HTTP edge turns each into a status; the words are shown to people as they stand. */
export type RefusalCode =
	'bad input' | 'role' | 'taken' | 'changed' | 'gate' | 'key reused' | 'too many';

/** An expected refusal: what was asked for cannot be done, and the message says what to do instead. */
export class Refused extends Error {
	constructor(
		readonly code: RefusalCode,
		message: string,
		readonly field?: string
	) {
		super(message);
		this.name = 'Refused';
	}
}

/** Not there, or not this shop's: the two look the same. */
export class NotFound extends Error {
	constructor(what = 'This is not here') {
		super(what);
		this.name = 'NotFound';
	}
}
