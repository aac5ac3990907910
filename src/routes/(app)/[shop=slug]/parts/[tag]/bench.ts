import { Clean, GradeInput } from '$lib/parts/input';
import { cleanPart, gradePart } from '$lib/server/parts';
import { action } from '$lib/server/people';
import { after } from './sheet';
import type { RequestEvent } from './$types';

/** What the bench does with a part on its own page. */
export const benchActions = {
	clean: action('work', Clean, async (ctx, input, event: RequestEvent) =>
		after(
			event,
			await cleanPart(ctx, event.params.tag, input),
			input.cameRight ? 'Cleaned: came right' : 'Cleaned: not right yet'
		)
	),
	rebuild: action('work', GradeInput, async (ctx, input, event: RequestEvent) =>
		after(
			event,
			await gradePart(ctx, event.params.tag, input),
			'Kept for rebuilding, in the red bin'
		)
	)
};
