import type { Question } from './questions';

export interface Answered {
	ids: number[];
	total: number;
	ms: number;
}

export interface ClassScore {
	class: string;
	count: number;
	recall: number;
	mrr: number;
	p50: number;
	p95: number;
	p99: number;
}

const mean = (values: readonly number[]) =>
	values.reduce((a, b) => a + b, 0) / (values.length || 1);

export function percentile(values: readonly number[], share: number): number {
	const sorted = [...values].sort((a, b) => a - b);
	return sorted[Math.min(sorted.length - 1, Math.ceil(share * sorted.length) - 1)] ?? NaN;
}

/** Right answers among the first ten, of as many as could be there; for none: 1 where nothing was answered. */
export function recallOf(question: Question, { ids, total }: Answered): number {
	if (question.right.length === 0) return total === 0 ? 1 : 0;
	const right = new Set(question.right);
	return ids.slice(0, 10).filter((id) => right.has(id)).length / Math.min(10, right.size);
}

/** One over the place of the first right answer. */
export function rankOf(question: Question, { ids, total }: Answered): number {
	if (question.right.length === 0) return total === 0 ? 1 : 0;
	const right = new Set(question.best ?? question.right);
	const at = ids.findIndex((id) => right.has(id));
	return at < 0 ? 0 : 1 / (at + 1);
}

/** Each class by itself, and all of those that have an answer together. */
export function scored(
	questions: readonly Question[],
	answers: readonly Answered[][]
): ClassScore[] {
	const rows = questions.map((question, at) => ({ question, passes: answers[at]! }));
	const row = (name: string, some: typeof rows): ClassScore => {
		const times = some.flatMap(({ passes }) => passes.map(({ ms }) => ms));
		return {
			class: name,
			count: some.length,
			recall: mean(some.map(({ question, passes }) => recallOf(question, passes[0]!))),
			mrr: mean(some.map(({ question, passes }) => rankOf(question, passes[0]!))),
			p50: percentile(times, 0.5),
			p95: percentile(times, 0.95),
			p99: percentile(times, 0.99)
		};
	};
	const names = [...new Set(questions.map((question) => question.class))];
	return [
		...names.map((name) =>
			row(
				name,
				rows.filter(({ question }) => question.class === name)
			)
		),
		row(
			'ALL',
			rows.filter(({ question }) => question.class !== 'none')
		)
	];
}
