import { Refused } from '$lib/refusal';

type Typed = Record<string, FormDataEntryValue | FormDataEntryValue[]>;

const isNothing = (value: FormDataEntryValue) =>
	typeof value === 'string' ? value.trim() === '' : value.size === 0;

/** A form as an object: empty fields are absent, a name sent twice or ending in [] is a list. */
export function formObject(form: FormData): Typed {
	const typed: Typed = {};
	for (const name of new Set(form.keys())) {
		const values = form.getAll(name).filter((value) => !isNothing(value));
		const field = name.replace(/\[\]$/, '');
		if (name.endsWith('[]')) typed[field] = values;
		else if (values.length > 1) typed[field] = values;
		else if (values[0] !== undefined) typed[field] = values[0];
	}
	return typed;
}

/** What was typed, to be shown again; files cannot be. */
export function typedText(typed: Typed): Record<string, string | string[]> {
	const text: Record<string, string | string[]> = {};
	for (const [name, value] of Object.entries(typed)) {
		if (/password/i.test(name)) continue;
		if (typeof value === 'string') text[name] = value;
		else if (Array.isArray(value)) text[name] = value.filter((one) => typeof one === 'string');
	}
	return text;
}

/** What a refused form shows again: what was typed, and that a field was emptied. */
export function typedAgain(form: FormData): Record<string, string | string[]> {
	const names = [...form.keys()].filter((name) => name !== 'idempotencyKey');
	const emptied = names.filter(
		(name) => !/password|\[\]$/i.test(name) && form.getAll(name).every((value) => value === '')
	);
	const { idempotencyKey: _, ...typed } = formObject(form);
	return { ...Object.fromEntries(emptied.map((name) => [name, ''])), ...typedText(typed) };
}

const tooLong = (fault: unknown) =>
	fault instanceof Error && 'status' in fault && fault.status === 413;

/** A body that was cut off because it is too long, or is not what it says, is the sender's to mend. */
export function bodyRefused(fault: unknown, otherwise: string): Refused {
	const said = 'This is more than can be sent at once. Send fewer or smaller photos.';
	return new Refused('bad input', tooLong(fault) ? said : otherwise);
}

export async function readForm(request: Request): Promise<FormData> {
	try {
		return await request.formData();
	} catch (fault) {
		throw bodyRefused(fault, 'Send the fields as a form.');
	}
}
