import type { GradeInput } from '$lib/parts/input';
import { inShop, type Context } from '../context';
import { sameVersion } from './edit';
import { changePart, partFor, type Done } from './row';

export const gradePart = (ctx: Context, tag: string, input: GradeInput): Promise<Done> =>
	inShop(ctx, async (tx, ctx) => {
		const row = await partFor(tx, ctx, tag, 'grade');
		sameVersion(row, input.version, `graded ${row.grade}`, input.grade);
		return changePart(
			tx,
			ctx,
			row,
			'grade',
			{ grade: input.grade },
			{ grade: input.grade, was: row.grade }
		);
	});
