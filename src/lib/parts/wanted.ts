import { engineKey } from '../codes/number';
import { tokensOf, type Token } from '../donors/lexemes';
import { goesBefore, stands, type Queued } from './place';

/** What somebody waits for, in words and keys. */
export interface Wanted {
	/** '' where only a number is known. */
	kind: string;
	/** Maker, model, type: free words. */
	engine: string;
	/** What was measured: free words with their units. */
	measures: string;
	numberKeys: readonly string[];
}

/** A part, or a kind that is still on a donor, as far as a want asks about it. */
export interface Wantable {
	kind: string;
	engineKey: string;
	/** The words of the engine that it fits, as donors are found by; apart by spaces. */
	engineWords: string;
	/** The words of the part itself. */
	words: string;
	numberKeys: readonly string[];
}

/** How a thing answers a want: 1 by number, 2 by engine, 3 by kind and measures, 4 by kind alone. */
export type FitRank = 1 | 2 | 3 | 4;

/** A calliper's slack, in mm. */
const SLACK = 0.25;
const FILLERS = new Set(['engine', 'motor', 'the', 'for', 'from', 'off', 'and', 'with', 'model']);

const isSize = ({ is }: Token) => is === 'size';
const isAmount = ({ is }: Token) => is === 'amount';

/** What names the engine: codes where there are any, else the words and short numbers. */
function naming(said: string): string[] {
	const tokens = tokensOf(said);
	const codes = tokens.filter(
		({ is, lexeme }) => is === 'code' && (lexeme.length > 3 || /[A-Z]/.test(lexeme))
	);
	const words = tokens.filter(
		({ is, lexeme }) =>
			is === 'code' || (is === 'word' && lexeme.length > 2 && !FILLERS.has(lexeme))
	);
	return (codes.length > 0 ? codes : words).map(({ lexeme }) => lexeme);
}

/** A code may be typed without its ending: TARN-21 for TARN-21L, 21 for 21L. */
function named(lexeme: string, words: readonly string[]): boolean {
	if (words.includes(lexeme)) return true;
	if (!/\d/.test(lexeme)) return false;
	const ending = lexeme.length > 3 ? /^/ : /^[A-Z]+$/;
	return words.some((word) => word.startsWith(lexeme) && ending.test(word.slice(lexeme.length)));
}

/** Whether free words for an engine name this one. */
export function namesEngine(said: string, thing: Pick<Wantable, 'engineKey' | 'engineWords'>) {
	const key = engineKey(said);
	if (key !== '' && key === thing.engineKey) return true;
	const asked = naming(said);
	const words = thing.engineWords.split(' ');
	return asked.length > 0 && asked.every((lexeme) => named(lexeme, words));
}

/** Whether everything measured is written on the part: lengths within a calliper's slack, amounts to the letter. */
export function measuresAgree(said: string, words: string): boolean {
	const asked = tokensOf(said).filter((token) => isSize(token) || isAmount(token));
	const written = words.split(' ');
	const sizes = written.filter((word) => /^[\d.]+mm$/.test(word)).map(parseFloat);
	return (
		asked.length > 0 &&
		asked.every((token) =>
			isSize(token)
				? sizes.some((mm) => Math.abs(mm - parseFloat(token.lexeme)) <= SLACK)
				: written.includes(token.lexeme)
		)
	);
}

/** How this answers that want, or null. The kind must be the same wherever the want names one. */
export function fitOf(want: Wanted, thing: Wantable): FitRank | null {
	if (want.kind !== '' && want.kind !== thing.kind) return null;
	if (want.numberKeys.some((key) => thing.numberKeys.includes(key))) return 1;
	if (want.kind === '') return null;
	const asksEngine = naming(want.engine).length > 0 || engineKey(want.engine) !== '';
	if (asksEngine && namesEngine(want.engine, thing)) return 2;
	if (measuresAgree(want.measures, thing.words)) return 3;
	const asksMore = asksEngine || want.measures !== '' || want.numberKeys.length > 0;
	return asksMore ? null : 4;
}

/** An open want with what stands on the shelf and answers it. */
export interface OpenWant extends Wanted {
	id: number;
	number: number;
	who: 'customer' | 'neighbour shop' | 'own job';
	/** The job, where the shop itself waits. */
	job: string;
	/** Parts of which somebody said that they are not the one. */
	not: readonly number[];
	answered: readonly Pick<Queued, 'id' | 'grade' | 'pulledAt'>[];
}

/** What was matched by a replaced number or a note that it fits counts as if it were its own. */
function rankOf(want: OpenWant, thing: Wantable & { id: number }): FitRank | null {
	if (want.not.includes(thing.id)) return null;
	return fitOf(want, thing) ?? (want.answered.some(({ id }) => id === thing.id) ? 2 : null);
}

/** The wants that this answers, those that fit it best first. */
export const wantsFor = <W extends OpenWant>(
	thing: Wantable & { id: number },
	open: readonly W[]
): W[] =>
	open
		.map((want) => ({ want, rank: rankOf(want, thing) }))
		.filter((one) => one.rank !== null)
		.sort((a, b) => a.rank! - b.rank! || a.want.number - b.want.number)
		.map(({ want }) => want);

/**
 * The want that waits for this part: one that it answers and that nothing before it in the queue answers already.
 * Each unit answers one want: of two that wait, the second is left for the second unit. Null where nobody waits.
 */
export function waitsFor<W extends OpenWant>(
	part: Queued & Wantable,
	open: readonly W[]
): W | null {
	if (!stands(part)) return null;
	const asking = wantsFor(part, open);
	const before = new Set(
		asking.flatMap(({ answered }) =>
			answered
				.filter((other) => other.id !== part.id && goesBefore(other, part))
				.map(({ id }) => id)
		)
	);
	return asking[before.size] ?? null;
}

/** Who waits, for those who need not know the name. */
export const waiterSaid = ({
	who,
	job,
	number
}: Pick<OpenWant, 'who' | 'job' | 'number'>): string =>
	`${who === 'own job' ? `own job ${job}` : `a ${who}`} (W${number})`;
