import { z } from 'zod';
import { Email } from '../people/input';
import { TEMPLATES, unknownIn, type TemplateName } from './templates';

const version = z.coerce.number({ error: 'Reload the page and save again' }).int();

/** How the shop's letters leave, as its page asks for it; a tick that is not there is a no. */
export const LetterSettingsInput = z.object({
	replyTo: z
		.union([z.literal(''), Email], { error: 'Enter an e-mail address like counter@shop.example' })
		.default(''),
	tellByItself: z
		.union([z.boolean(), z.enum(['yes', 'on', 'no'])])
		.default(false)
		.transform((typed) => typed === true || typed === 'yes' || typed === 'on'),
	quietDays: z.coerce
		.number({ error: 'Enter the days as a whole number from 1 to 365' })
		.int('Enter the days as a whole number from 1 to 365')
		.min(1, 'Enter the days as a whole number from 1 to 365')
		.max(365, 'Enter the days as a whole number from 1 to 365'),
	version
});
export type LetterSettingsInput = z.infer<typeof LetterSettingsInput>;

const filled = (what: string, most: number) =>
	z
		.string({ error: `Enter ${what}` })
		.trim()
		.min(1, `Enter ${what}`)
		.max(most, `Keep ${what} under ${most} characters`)
		.superRefine((text, issues) => {
			const [first] = unknownIn(text);
			if (first !== undefined)
				issues.addIssue(`There is nothing called {${first}}. Use one of the words below in braces`);
		});

export const TemplateInput = z.object({
	name: z.enum(Object.keys(TEMPLATES) as [TemplateName, ...TemplateName[]], {
		error: 'Choose a letter'
	}),
	subject: filled('the subject', 150),
	text: filled('the text of the letter', 4000),
	version,
	usual: z.enum(['usual']).optional()
});
export type TemplateInput = z.infer<typeof TemplateInput>;
