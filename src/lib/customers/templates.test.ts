import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { PLACEHOLDERS, TEMPLATES, unknownIn, written, type Values } from './templates';

const values: Values = { ...PLACEHOLDERS, shop: 'Osiergate Engine Bench', terms: '' };

describe('a letter', () => {
	it('says in the usual words what is here, that it is used, and to whom it goes', () => {
		const { subject, text } = written(TEMPLATES.part, values);
		expect(subject).toBe('Osiergate Engine Bench: we have your recoil starter');
		expect(text).toContain('Hello Ida Brennick,');
		expect(text).toContain(
			'a used recoil starter off Ondrake TARN-21L, good used. We ask $28 for it.\n'
		);
		expect(text).toContain('say W12');
		expect(text).not.toMatch(/[{}]/);
	});

	it.each(Object.entries(TEMPLATES))('%s names nothing that there is not', (_, template) => {
		expect(unknownIn(template.subject + template.text)).toEqual([]);
	});

	it('points out what stands for nothing', () => {
		expect(unknownIn('{nmae}, {name}, { name }, {nmae}, {}')).toEqual(['nmae', '']);
	});

	it('never reads a value as a template, and keeps the subject on one line', () => {
		const word = fc.string({ unit: fc.constantFrom('{', '}', 'name', 'shop', '\n', 'x', '$&') });
		fc.assert(
			fc.property(word, word, (name, shop) => {
				const said = written(
					{ subject: '{name}', text: '[{name}|{shop}]' },
					{ ...values, name, shop }
				);
				expect(said.subject).not.toContain('\n');
				const bare = (text: string) => text.replace(/\s/g, '');
				expect(bare(said.text)).toBe(bare(`[${name}|${shop}]`));
			})
		);
	});
});
