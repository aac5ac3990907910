import type { CauseId } from './causes';
import type { EngineClass } from './kind';
import { PROVED_BY, TRIAGE, type Question } from './triage.data';

export { TRIAGE };

/** What was answered, by the id of the question; a question left out was not looked at. */
export type TriageAnswers = Readonly<Partial<Record<Question['id'], string | readonly string[]>>>;

export interface Suggestion {
	cause: CauseId;
	/** Seen: a sign that proves it. Likely: the signs speak for it. Perhaps: they allow it. */
	sure: 'seen' | 'likely' | 'perhaps';
	/** The answers that speak for it. */
	because: string[];
	against: string[];
	/** What proves it once the engine is open. */
	provedBy: string;
}

export interface TriageCaution {
	id: string;
	said: string;
}

export interface Triaged {
	/** Surest first; empty when nothing speaks for anything. */
	causes: Suggestion[];
	cautions: TriageCaution[];
	/** Turned free by hand and nothing broken to be seen: only then may it be cranked. */
	mayCrank: boolean;
}

const TWO_STROKE: readonly EngineClass[] = ['SA', 'TR'];
const FOUR_STROKE_ONLY: readonly CauseId[] = ['no-oil', 'valve'];
const SEEN = 3;

/** The questions of an engine; two-strokes have no dipstick. Class null: not said yet. */
export const triageFor = (engineClass: EngineClass | null): Question[] =>
	TRIAGE.filter(({ fourStroke }) => !fourStroke || !isTwoStroke(engineClass));

const isTwoStroke = (engineClass: EngineClass | null) =>
	engineClass !== null && TWO_STROKE.includes(engineClass);

const chosen = (answers: TriageAnswers, id: Question['id']): string[] => [answers[id] ?? []].flat();

function happensTo(cause: CauseId, engineClass: EngineClass | null): boolean {
	if (engineClass === null) return true;
	return isTwoStroke(engineClass) ? !FOUR_STROKE_ONLY.includes(cause) : cause !== 'lean';
}

interface Spoken {
	said: string;
	weight: number;
}

function heard(answers: TriageAnswers, engineClass: EngineClass | null): Map<CauseId, Spoken[]> {
	const found = new Map<CauseId, Spoken[]>();
	for (const { id, answers: possible } of triageFor(engineClass)) {
		for (const { id: each, said, speaks } of possible) {
			if (!chosen(answers, id).includes(each)) continue;
			for (const { cause, weight } of speaks)
				found.set(cause, [...(found.get(cause) ?? []), { said, weight }]);
		}
	}
	return found;
}

const DO_NOT_CRANK: Readonly<Record<string, string>> = {
	springy:
		'Do not crank it and never force it: there is liquid in the cylinder. Plug out, tip it over a pan, let it drain.',
	solid:
		'Do not crank it and do not pull the rope: it is locked, and that breaks the starter you want to keep.',
	clunk: 'Do not crank it: something is loose inside, and one more turn can go through the block.',
	'no-valves': 'Do not crank it: the valves do not move, and what still turns can hit them.',
	hole: 'Do not crank it: the pieces inside do the rest.'
};

const OF_SIGNS: Readonly<Record<string, string>> = {
	key: 'After a strike: pull the flywheel with a puller, no hammer on the rim, and look at hub and keyway under strong light.',
	holes:
		'It may have run too fast: its flywheel is destroyed, never shelved, and its governor parts are not kept.',
	raced:
		'It may have run too fast: its flywheel is destroyed, never shelved, and its governor parts are not kept.',
	mud: 'Flood mud: gloves and a mask. Oil of a flooded engine gets a can of its own.',
	melted: 'Burnt plastic: gloves and a mask.',
	runs: 'Run it outdoors or with the exhaust led away; oil and muffler stay hot for long.'
};

const FUEL_IN_OIL = 'Fuel in the oil: drain it outdoors, before anything sparks.';

function cautionsOf(answers: TriageAnswers): TriageCaution[] {
	const turn = chosen(answers, 'turn');
	const signs = chosen(answers, 'signs');
	const stop = [...turn, ...signs].find((id) => id in DO_NOT_CRANK);
	const said = [
		...(stop ? [{ id: 'do-not-crank', said: DO_NOT_CRANK[stop]! }] : []),
		...(chosen(answers, 'oil').includes('over') ? [{ id: 'fuel-in-oil', said: FUEL_IN_OIL }] : []),
		...Object.entries(OF_SIGNS).flatMap(([id, said]) => (signs.includes(id) ? [{ id, said }] : []))
	];
	return said.filter((one, at) => said.findIndex((other) => other.said === one.said) === at);
}

/** Whether it may be cranked: turned free and even by hand, and no hole to be seen. */
export const mayCrank = (answers: TriageAnswers): boolean =>
	chosen(answers, 'turn').includes('free') && !chosen(answers, 'signs').includes('hole');

/**
 * What the minute at the tailgate suggests: causes of death, surest first, each with what speaks for
 * it, what against it and what will prove it; and the cautions that these answers call for. The
 * person decides. In: answers by question, unknown ids are not heard; the class of the engine, null
 * while nobody has said it (two-strokes have no oil of their own and no valves). Common practice, no source.
 */
export function triage(answers: TriageAnswers, engineClass: EngineClass | null = null): Triaged {
	const ranked = [...heard(answers, engineClass)]
		.filter(([cause]) => happensTo(cause, engineClass))
		.map(([cause, spoken]) => {
			const score = spoken.reduce((sum, { weight }) => sum + weight, 0);
			const proved = spoken.some(({ weight }) => weight === SEEN);
			const likely = score >= 2 ? ('likely' as const) : ('perhaps' as const);
			const suggestion: Suggestion = {
				cause,
				sure: proved ? 'seen' : likely,
				because: spoken.filter(({ weight }) => weight > 0).map(({ said }) => said),
				against: spoken.filter(({ weight }) => weight < 0).map(({ said }) => said),
				provedBy: PROVED_BY[cause]
			};
			return { suggestion, score, proved };
		})
		.filter(({ score, proved }) => proved || score > 0)
		.sort((a, b) => Number(b.proved) - Number(a.proved) || b.score - a.score);
	return {
		causes: ranked.map(({ suggestion }) => suggestion),
		cautions: cautionsOf(answers),
		mayCrank: mayCrank(answers)
	};
}
