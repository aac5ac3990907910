/** The digits of a phone number, as numbers are compared: without the ways to write a country's code. */
export function phoneKey(typed: string): string {
	return typed.replace(/\D/g, '').replace(/^0+/, '');
}

/** A text as people are looked for by: lower case, without accents. */
export const plainText = (text: string): string =>
	text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase().replace(/\s+/g, ' ').trim();

interface Reach {
	name: string;
	phone: string;
	email: string;
}

/** Everything that somebody is found by. */
export const foundBy = ({ name, phone, email }: Reach): string =>
	[plainText(name), phoneKey(phone), email].filter(Boolean).join(' ');

/** What was typed to find somebody, in pieces that must all be there; figures lose their dashes. */
export function sought(typed: string): string[] {
	const text = plainText(typed.slice(0, 80));
	if (/^[\d\s()+./-]+$/.test(text)) return [phoneKey(text)].filter(Boolean);
	return text.split(' ').filter(Boolean).slice(0, 6);
}
