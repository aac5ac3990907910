export type TemplateName = 'part' | 'donor';

/** What a template may name in braces. */
export const PLACEHOLDERS = {
	name: 'Ida Brennick',
	wanted: 'recoil starter for Ondrake TARN-21L',
	part: 'recoil starter',
	engine: 'Ondrake TARN-21L',
	grade: 'good used',
	price: 'We ask $28 for it.',
	terms: 'We fit it ourselves and do not sell it loose.',
	want: 'W12',
	shop: 'the name of the shop'
} as const;
export type Placeholder = keyof typeof PLACEHOLDERS;
export type Values = Record<Placeholder, string>;

export interface Template {
	subject: string;
	text: string;
}

export const TEMPLATES: Record<TemplateName, Template & { title: string; when: string }> = {
	part: {
		title: 'A part is here',
		when: 'Sent when a part in the shop answers what somebody waits for.',
		subject: '{shop}: we have your {part}',
		text: `Hello {name},

you asked us for this: {wanted}.

We have one now: a used {part} off {engine}, {grade}. {price} {terms}

It is not kept for you yet. Call us or answer this letter, and say {want}.

{shop}
`
	},
	donor: {
		title: 'An engine came in',
		when: 'Sent when an engine came in that still carries what somebody waits for.',
		subject: '{shop}: an engine came in with your {part}',
		text: `Hello {name},

you asked us for this: {wanted}.

An engine came in that still carries one: {engine}. The part would be used. It is not off yet and not tested, so we cannot promise it. {price} {terms}

Shall we take it off for you? Call us or answer this letter, and say {want}.

{shop}
`
	}
};

const BRACES = /\{([^{}\s]{0,40})\}/g;

const isPlaceholder = (word: string): word is Placeholder => Object.hasOwn(PLACEHOLDERS, word);

/** Words in braces that stand for nothing. */
export const unknownIn = (text: string): string[] => [
	...new Set(
		[...text.matchAll(BRACES)].map((found) => found[1]!).filter((word) => !isPlaceholder(word))
	)
];

const fill = (text: string, values: Values) =>
	text.replace(BRACES, (said, word: string) => (isPlaceholder(word) ? values[word] : said));

const oneLine = (text: string) => text.replace(/\s+/g, ' ').trim();

/**
 * A letter in the shop's words. What stands in the values is never read as a template again, and no value
 * breaks the line of the subject.
 */
export function written({ subject, text }: Template, values: Values): Template {
	const body = fill(text, values)
		.split('\n')
		.map((line) => line.replace(/[ \t]+/g, ' ').trimEnd())
		.join('\n')
		.replace(/\n{3,}/g, '\n\n');
	return { subject: oneLine(fill(subject, values)).slice(0, 200), text: `${body.trim()}\n` };
}
