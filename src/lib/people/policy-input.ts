import { engineKey } from '$lib/codes/number';
import { isKindId, SCRAP_CLASSES } from '$lib/trade';
import { z } from 'zod';
import { DEFAULT_POLICY, type Policy } from './policy';
import { FIGURES, fieldOf, type FigureUnit } from './policy-figures';
import { inCents, typedAmount } from './typed-money';

interface Range {
	least: number;
	most: number;
	whole?: boolean;
}

const MONEY: Range = { least: 0, most: 1_000_000 };
const WEIGHT: Range = { least: 0.5, most: 1000 };

const RANGE: Record<FigureUnit, Range> = {
	'per cent': { least: 0, most: 100 },
	'per cent a year': { least: 0, most: 99 },
	money: MONEY,
	'money an hour': MONEY,
	'money a year': MONEY,
	minutes: { least: 0, most: 1000 },
	'times the odds': { least: 0.01, most: 1000 },
	days: { least: 1, most: 3650, whole: true },
	tests: WEIGHT,
	'parts out': WEIGHT,
	calls: WEIGHT,
	donors: { least: 1, most: 1000, whole: true },
	sales: WEIGHT
};

const STEP: Range = { least: 0.01, most: 10_000 };

/** A figure as typed; left empty it goes back to what is usual. */
const typed = (label: string, { least, most, whole }: Range) =>
	z
		.string()
		.transform((text, issues) => {
			const amount = typedAmount(text.replace('%', ''));
			if (amount !== null && amount >= least && amount <= most && !(whole && amount % 1))
				return amount;
			issues.addIssue(
				`Enter “${label}” as a ${whole ? 'whole ' : ''}number from ${least} to ${most}`
			);
			return z.NEVER;
		})
		.optional();

const version = z.coerce.number().int().min(0);

const rangeOf = (figure: (typeof FIGURES)[number]): Range =>
	figure.path[0].startsWith('step') && figure.path[0] !== 'stepLimitCents'
		? STEP
		: RANGE[figure.unit];

/** The page of figures: each may be empty; `reset` names one that goes back to its default. */
export const PolicyForm = z.object({
	version,
	reset: z.string().optional(),
	...Object.fromEntries(
		FIGURES.map((figure) => [fieldOf(figure), typed(figure.label, rangeOf(figure))])
	),
	...Object.fromEntries(SCRAP_CLASSES.map(({ id, said }) => [`scrap-${id}`, typed(said, MONEY)]))
});
export type PolicyForm = { version: number; reset?: string } & Record<
	string,
	number | string | undefined
>;

export const FamilyForm = z.object({
	version,
	engine: z
		.string({ error: 'Enter the engine, maker and model' })
		.refine((said) => engineKey(said) !== '', 'Enter the engine, maker and model'),
	mark: z.enum(['lots', 'some', 'hardly'], { error: 'Choose how many are about' })
});

const minutes = RANGE.minutes;

/** The figures that a shop may set for one kind, as they are asked for. */
export const KIND_FIELDS = [
	{ field: 'callsPerYear', label: 'Calls a year', range: minutes, unit: 'a year' },
	{ field: 'comeBack', label: 'Comes back', range: RANGE['per cent'], unit: 'per cent' },
	{ field: 'kitCents', label: 'Kit with every sale', range: MONEY, unit: 'money' },
	{ field: 'pullMinutes', label: 'Pulling', range: minutes, unit: 'minutes' },
	{ field: 'cleanMinutes', label: 'Cleaning', range: minutes, unit: 'minutes' },
	{ field: 'testMinutes', label: 'Testing', range: minutes, unit: 'minutes' },
	{ field: 'refitMinutes', label: 'Second fitting', range: minutes, unit: 'minutes' },
	{ field: 'massGrams', label: 'Weight', range: { least: 1, most: 200_000 }, unit: 'g' }
] as const;

export const KindForm = z.object({
	version,
	kind: z.string().refine(isKindId, 'Choose the kind of part from the list'),
	size: z.enum(['s', 'm', 'l', 'xl']).optional(),
	...Object.fromEntries(KIND_FIELDS.map(({ field, label, range }) => [field, typed(label, range)]))
});
export type KindForm = { version: number; kind: string; size?: 's' | 'm' | 'l' | 'xl' } & Record<
	string,
	number | string | undefined
>;

const inPolicy = (amount: number, unit: string, currency: string): number => {
	if (unit.startsWith('per cent')) return amount / 100;
	return unit.startsWith('money') ? inCents(amount, currency) : amount;
};

/** The policy after the page was saved: what is empty or reset is the default again. */
export function policyOf(before: Policy, form: PolicyForm, currency: string): Policy {
	const after = structuredClone({
		...DEFAULT_POLICY,
		families: before.families,
		kinds: before.kinds,
		limits: before.limits
	});
	for (const figure of FIGURES) {
		const field = fieldOf(figure);
		const amount = form[field];
		if (typeof amount !== 'number' || form.reset === field) continue;
		const [key, part] = figure.path;
		const value = inPolicy(amount, figure.unit, currency);
		if (part === undefined) Object.assign(after, { [key]: value });
		else Object.assign(after[key], { [part]: value });
	}
	for (const { id } of SCRAP_CLASSES) {
		const amount = form[`scrap-${id}`];
		if (typeof amount === 'number') after.scrapKgCents[id] = inCents(amount, currency);
	}
	return after;
}

/** A kind's own figures from its form. */
export function kindFiguresOf(form: KindForm, currency: string): Policy['kinds'][string] {
	const own: Record<string, number | string> = form.size ? { size: form.size } : {};
	for (const { field, unit } of KIND_FIELDS) {
		const amount = form[field];
		if (typeof amount === 'number') own[field] = inPolicy(amount, unit, currency);
	}
	return own;
}

/** What of a policy is the shop's own: whole groups that differ from the defaults. */
export const ownOf = (policy: Policy): Partial<Policy> =>
	Object.fromEntries(
		Object.entries(policy).filter(
			([key, value]) =>
				JSON.stringify(value) !== JSON.stringify(DEFAULT_POLICY[key as keyof Policy])
		)
	);
