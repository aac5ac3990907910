import { setOf } from '$lib/trade';
import { z } from 'zod';
import { kindId } from '../typed';
import { answerIn, type BenchAnswer } from './answer';

/** The bench's form as it is sent where no script answers. */
export const BenchForm = z
	.looseObject({ kind: kindId })
	.transform((fields, issues): BenchAnswer => {
		const read = answerIn(fields, setOf(fields.kind));
		if ('answer' in read) return read.answer;
		for (const { field, message } of read.problems)
			issues.addIssue({ code: 'custom', path: [field], message });
		return z.NEVER;
	});
