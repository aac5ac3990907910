import { LetterSettingsInput, TemplateInput } from '$lib/customers/settings';
import { PLACEHOLDERS } from '$lib/customers/templates';
import {
	letterSettings,
	listTemplates,
	saveLetterSettings,
	saveTemplate
} from '$lib/server/customers';
import { action, page } from '$lib/server/people';

export const load = page('run', async (ctx, { params }) => ({
	settings: await letterSettings(ctx),
	templates: await listTemplates(ctx),
	placeholders: Object.entries(PLACEHOLDERS).map(([word, like]) => ({ word, like })),
	back: { href: `/${params.shop}/people`, label: 'More' }
}));

export const actions = {
	settings: action('run', LetterSettingsInput, async (ctx, input) => {
		await saveLetterSettings(ctx, input);
		return { to: '?done=Saved' };
	}),
	template: action('run', TemplateInput, async (ctx, input) => {
		await saveTemplate(ctx, input);
		return { to: `?done=${input.usual ? 'The usual words again' : 'Letter saved'}#${input.name}` };
	})
};
