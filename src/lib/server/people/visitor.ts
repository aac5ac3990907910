import { fail, isHttpError, isRedirect, redirect, type RequestEvent } from '@sveltejs/kit';
import type { z } from 'zod';
import { faultOf } from '../http/fault';
import { formObject, readForm, typedAgain } from '../http/form';

/** The action of a page outside any shop (sign-up, invitation): parse, do, redirect; or back with what was typed. */
export function visitorAction<S extends z.ZodType, E extends RequestEvent>(
	schema: S,
	verb: (input: z.output<S>, event: E) => Promise<{ to: string }>
) {
	return async (event: E) => {
		let form: FormData | undefined;
		let to: string;
		try {
			form = await readForm(event.request);
			({ to } = await verb(schema.parse(formObject(form)), event));
		} catch (thrown) {
			if (isRedirect(thrown) || isHttpError(thrown)) throw thrown;
			const { status, problems } = faultOf(thrown);
			return fail(status, { problems, typed: form ? typedAgain(form) : {} });
		}
		redirect(303, to);
	};
}
