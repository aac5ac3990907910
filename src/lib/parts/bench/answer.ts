import type { Pull } from '../input';
import { GRADES, PROOFS, type Grade, type ProofWay } from '../words';
import type { z } from 'zod';

/** Why a part is bad, one tap each. */
export const BAD = ['cracked', 'worn', 'bent', 'burnt', 'rusted', 'thread gone'] as const;
export const NOT_KEPT = 'not worth keeping';
export const DESTROYED = 'destroyed, not safe';

/** An answer as it is sent: a part to log, or a kind to leave on. */
export type BenchAnswer =
	{ what: 'log'; kind: string; body: z.input<typeof Pull> } | { what: 'leave'; kind: string };

export interface Problem {
	field: string;
	message: string;
}

/** A form's fields, empty ones left out; several of a name as a list. */
export type Fields = Readonly<Record<string, unknown>>;

const text = (fields: Fields, name: string): string | undefined => {
	const typed = fields[name];
	return typeof typed === 'string' && typed !== '' ? typed : undefined;
};
const list = (fields: Fields, name: string): string[] => [fields[name] ?? []].flat().map(String);

const NUMBER = /^-?\d+([.,]\d+)?$/;
const number = (typed: string) => Number(typed.trim().replace(',', '.'));

/** The fields named after what a test reads: `read-coil`. */
const readFields = (fields: Fields) =>
	Object.keys(fields).filter((name) => name.startsWith('read-') && text(fields, name));

/** The figures of a form by the field of the test; undefined where none was typed. */
export function readIn(fields: Fields): Record<string, number> | undefined {
	const names = readFields(fields);
	if (names.length === 0) return undefined;
	return Object.fromEntries(
		names.map((name) => [name.slice('read-'.length), number(text(fields, name)!)])
	);
}

function proofIn(fields: Fields, passed: boolean) {
	const typed = text(fields, 'how');
	const how = PROOFS.find((each) => each === typed) ?? (passed ? undefined : 'bench test cold');
	if (!how) return {};
	const figures = readIn(fields);
	const figure = text(fields, 'figure');
	return {
		proof: {
			...{ how: how as ProofWay, passed },
			...(figures ? { figures } : {}),
			...(figure ? { figure: number(figure), unit: text(fields, 'unit') ?? '' } : {})
		}
	};
}

/** What came off with it, and what of its set is missing. */
function setIn(fields: Fields, set: readonly string[]) {
	const missing = list(fields, 'missing').filter((piece) => set.includes(piece));
	const there = set.filter((piece) => !missing.includes(piece));
	return { set: there.join(', '), setMissing: missing.join(', ') };
}

function keptAs(say: string): Grade | undefined {
	if (say === 'core') return 'core';
	return GRADES.find((grade) => say === `keep ${grade}`);
}

function bodyOf(fields: Fields, kind: string, say: string, set: readonly string[]) {
	const note = text(fields, 'note');
	const base = { kind, ...(note ? { note } : {}) };
	if (say === 'destroy') return { ...base, scrapped: { reason: DESTROYED, destroyed: true } };
	if (say.startsWith('scrap '))
		return { ...base, scrapped: { reason: say.slice('scrap '.length).slice(0, 120) } };
	const checklist = list(fields, 'checklist');
	const kept = { ...base, ...setIn(fields, set), ...(checklist.length > 0 ? { checklist } : {}) };
	if (say === 'red bin') return { ...kept, grade: 'untested' as const, ...proofIn(fields, false) };
	const grade = keptAs(say);
	if (!grade) return null;
	return { ...kept, grade, ...(say === 'core' ? {} : proofIn(fields, true)) };
}

/**
 * The fields of the bench's form, with the button that was pressed as `say`, as the answer that is sent.
 * In: the fields, and the set that belongs to the kind. Out: the answer, or what is to be put right.
 */
export function answerIn(
	fields: Fields,
	set: readonly string[]
): { answer: BenchAnswer } | { problems: Problem[] } {
	const kind = text(fields, 'kind') ?? '';
	const say = text(fields, 'say') ?? '';
	if (say === 'leave') return { answer: { what: 'leave', kind } };
	const wrong = readFields(fields).filter((name) => !NUMBER.test(text(fields, name)!.trim()));
	if (wrong.length > 0)
		return {
			problems: wrong.map((field) => ({
				field,
				message: 'Enter each figure as a number, like 18 or 18.5'
			}))
		};
	const body = bodyOf(fields, kind, say, set);
	if (!body) return { problems: [{ field: 'next', message: 'Choose kept, bad or left on' }] };
	return { answer: { what: 'log', kind, body } };
}

/** What an answer says, for the list of what was done: "kept, good used". */
export function answerSaid(answer: BenchAnswer): string {
	if (answer.what === 'leave') return 'left on';
	const { scrapped, grade, proof } = answer.body;
	if (scrapped) return scrapped.destroyed ? 'destroyed' : `to scrap: ${scrapped.reason}`;
	if (proof && proof.passed !== true) return 'failed: red bin';
	return `kept, ${grade}`;
}

/** Whether an answer makes the part stock, so that the checklist of a safety kind is asked for. */
export const keeps = (answer: BenchAnswer): boolean =>
	answer.what === 'log' && answer.body.scrapped === undefined;
