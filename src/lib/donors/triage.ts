import { isKindId, TRIAGE, triageFor, type EngineClass, type TriageAnswers } from '$lib/trade';
import { z } from 'zod';

const FIGURE = 'Enter the figure as a number, like 18 or 18.5';

const one = (id: (typeof TRIAGE)[number]['id']) => {
	const { asks, answers } = TRIAGE.find((question) => question.id === id)!;
	const ids = answers.map((each) => each.id);
	return z.enum(ids as [string, ...string[]], {
		error: `“${asks}”: choose an answer from the list`
	});
};

/** What the first minute showed; a question left out was not looked at. */
const Answers = z
	.object({
		...{ plug: one('plug'), oil: one('oil'), turn: one('turn'), thumb: one('thumb') },
		...{ spark: one('spark'), signs: z.array(one('signs')).max(30) }
	})
	.partial();

const Tried = z.object({
	passed: z.boolean(),
	figure: z.number({ error: FIGURE }).finite(FIGURE).nullable().default(null),
	unit: z.string().max(20).default('')
});

export const TriageInput = z.object({
	answers: Answers,
	/** What was tried in place, by kind. */
	inPlace: z.record(z.string().refine(isKindId, 'Choose a kind from the list'), Tried).default({}),
	version: z.coerce.number().int().default(0)
});
export type TriageInput = z.infer<typeof TriageInput>;

const typedFigure = (typed: unknown): number | null =>
	typeof typed === 'string' && typed.trim() !== '' ? Number(typed.trim().replace(',', '.')) : null;

function triedIn(fields: Record<string, unknown>): Record<string, unknown> {
	const tried = Object.entries(fields).filter(
		([name, how]) => name.startsWith('tried-') && how !== 'not'
	);
	return Object.fromEntries(
		tried.map(([name, how]) => {
			const kind = name.slice('tried-'.length);
			const figure = typedFigure(fields[`figure-${kind}`]);
			return [kind, { passed: how === 'worked', figure, unit: fields[`unit-${kind}`] ?? '' }];
		})
	);
}

/** The page as its form sends it: `plug`, `signs[]`, and for each thing tried `tried-` and `figure-`. */
export const TriageForm = z.preprocess((sent) => {
	const fields = sent as Record<string, unknown>;
	return {
		answers: Object.fromEntries(TRIAGE.flatMap(({ id }) => (fields[id] ? [[id, fields[id]]] : []))),
		inPlace: triedIn(fields),
		version: fields.version
	};
}, TriageInput);

export const TriageUndo = z.object({ event: z.coerce.number().int().positive() });

/** What was answered, in words, question by question. */
export function answersSaid(
	answers: TriageAnswers,
	engineClass: EngineClass | null
): { asks: string; said: string }[] {
	return triageFor(engineClass).flatMap(({ id, asks, answers: possible }) => {
		const given = [answers[id] ?? []].flat();
		const said = possible.filter((one) => given.includes(one.id)).map((one) => one.said);
		return said.length > 0 ? [{ asks, said: said.join(', ') }] : [];
	});
}

/** The look at a donor as its page shows it. */
export interface TriageView {
	answers: TriageAnswers;
	inPlace: Record<string, { passed: boolean; figure: number | null; unit: string }>;
	by: string | null;
	at: Date | null;
	version: number;
	/** The event that can be undone. */
	undo: number | null;
}
