import { isKindId, testFields, type Limits } from '$lib/trade';
import { z } from 'zod';
import { typedAmount } from './typed-money';

const bound = z.number({ error: 'Enter each limit as a number, like 2 or 0.004' }).optional();

/** What was typed; left empty, the usual bound counts; what is no number stays to be refused. */
function typed(text: unknown): number | undefined {
	if (typeof text !== 'string' || text.trim() === '') return undefined;
	return typedAmount(text) ?? NaN;
}

function limitsIn(fields: Record<string, unknown>): Record<string, unknown> {
	const kind = String(fields.kind ?? '');
	if (!isKindId(kind)) return {};
	return Object.fromEntries(
		testFields(kind).map(({ id }) => {
			const least = typed(fields[`least-${id}`]);
			const most = typed(fields[`most-${id}`]);
			const given = [['least', least] as const, ['most', most] as const];
			return [id, Object.fromEntries(given.filter(([, value]) => value !== undefined))];
		})
	);
}

const Limit = z
	.object({ least: bound, most: bound })
	.refine(({ least = -Infinity, most = Infinity }) => least <= most, {
		error: 'Enter a least that is not above the most',
		path: ['least']
	});

/** The shop's own bounds for the test of a kind. */
export const LimitsForm = z.preprocess(
	(sent) => {
		const fields = sent as Record<string, unknown>;
		return { kind: fields.kind, version: fields.version, limits: limitsIn(fields) };
	},
	z.object({
		version: z.coerce.number().int().min(0),
		kind: z.string().refine(isKindId, 'Choose the kind of part from the list'),
		limits: z.record(z.string(), Limit)
	})
);

/** Only the fields that have a bound of the shop's own. */
export const ownLimits = (limits: Limits): Limits =>
	Object.fromEntries(
		Object.entries(limits).filter(
			([, { least, most }]) => least !== undefined || most !== undefined
		)
	);
