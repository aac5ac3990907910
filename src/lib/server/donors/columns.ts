import { engineKey } from '$lib/codes/number';
import type { DonorEdit } from '$lib/donors/input';
import { engineLexemes } from '$lib/donors/lexemes';
import { may } from '$lib/people/role';
import { Refused } from '$lib/refusal';
import type { Context } from '../context';
import type { DonorRow } from './rows';

type Columns = Partial<
	Omit<DonorRow, 'shopId' | 'id' | 'number' | 'state' | 'version' | 'takenInAt'>
>;

const NOT_READ = {
	...{ maker: '', model: '', typeCode: '', dateCode: '', serial: '', offMachine: '' },
	...{ displacementCc: null, shaft: null }
};

/** What was said about a donor, in the columns of its row; what was not said is not touched. */
export function donorColumns(ctx: Context, input: DonorEdit, before?: DonorRow): Columns {
	if (input.paidCents !== undefined && !may(ctx.role, 'see costs'))
		throw new Refused('role', 'Only the owner or the counter can say what was paid.', 'paid');
	const { class: engineClass, version: _, ...rest } = input;
	const columns: Columns = { ...rest, ...(engineClass === undefined ? {} : { engineClass }) };
	if (input.maker !== undefined || input.model !== undefined)
		columns.engineKey = engineKey(
			`${input.maker ?? before?.maker ?? ''} ${input.model ?? before?.model ?? ''}`
		);
	const searchWords = engineLexemes({ ...NOT_READ, ...before, ...columns });
	return { ...columns, searchWords, ...causeColumns(input, before) };
}

/** A cause is never surer than somebody said, and a second one never stands alone or twice. */
function causeColumns(input: DonorEdit, before?: DonorRow): Columns {
	if (input.cause === undefined && input.secondCause === undefined && input.sureness === undefined)
		return {};
	const cause = input.cause === undefined ? (before?.cause ?? null) : input.cause;
	const second =
		input.secondCause === undefined ? (before?.secondCause ?? null) : input.secondCause;
	const sureness = input.sureness === undefined ? (before?.sureness ?? null) : input.sureness;
	if (second && !cause)
		throw new Refused('bad input', 'Choose the cause of death before a second one.', 'cause');
	return {
		cause,
		secondCause: second === cause ? null : second,
		sureness: cause ? (sureness ?? 'told') : null
	};
}
