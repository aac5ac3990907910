import { numberKey } from '../codes/number';
import { lexemesOf } from '../donors/lexemes';

export interface Searchable {
	label: string;
	numbers: readonly string[];
	note: string;
	engine: string;
	set: string;
}

/** Everything of its own that a part may be found by; its kind and its donor's engine are added to it. */
export function searchWords({ label, numbers, note, engine, set }: Searchable): string {
	const whole = [...numbers, engine].map(numberKey).filter((key) => /\d/.test(key));
	const rest = lexemesOf(label, ...numbers, engine, note, set).split(' ');
	// who counted them may be asked for the word alone
	const counted = rest.some((lexeme) => /^\d+tooth$/.test(lexeme)) ? ['tooth'] : [];
	return [...new Set([...whole, ...rest, ...counted])].filter(Boolean).join(' ');
}
