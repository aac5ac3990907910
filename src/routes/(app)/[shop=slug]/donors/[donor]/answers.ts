/** What stands in the fields of a page with several forms: typed, else saved; and what to say beside them. */
export interface Answers {
	value(field: string, saved: string | number | null | undefined): string;
	values(field: string, saved: string[]): string[];
	problem(field: string): string | undefined;
	/** Whether one of these fields has something to say, so that its form stands open. */
	any(fields: string[]): boolean;
}

interface Form {
	problems?: { field: string; message: string }[];
	typed?: Record<string, string | string[]>;
}

/** The form that was sent is known by its fields; the others keep what is saved. */
export function answersOf(form: Form | null): Answers {
	const typed = form?.typed ?? {};
	const problems = form?.problems ?? [];
	return {
		value: (field, saved) => String(typed[field] ?? saved ?? ''),
		values: (field, saved) => (field in typed ? [typed[field] ?? []].flat() : saved),
		problem: (field) => problems.find((one) => one.field === field)?.message,
		any: (fields) => fields.some((field) => field in typed) && problems.length > 0
	};
}
