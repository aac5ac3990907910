import { z } from 'zod';
import { parseDisplacement } from '../units';
import { DonorEdit } from './input';
import { PLATE_FIELDS, type PlateField } from './plate-fields';

export const PLATE_LABELS: Record<PlateField, string> = {
	maker: 'Maker of the engine',
	model: 'Model',
	typeCode: 'Type',
	dateCode: 'Code',
	serial: 'Serial',
	displacementCc: 'Displacement',
	emissionFamily: 'Emission family'
};

export const AskReading = z.object({
	photo: z.coerce.number({ error: 'Choose the photo to read' }).int().positive()
});

const some = z.array(z.enum(PLATE_FIELDS)).default([]);
const typed = z.string().trim().max(60, 'Keep it under 60 characters').default('');

const CC_SAID = 'Enter the displacement as a figure like 210, or 12.9 cu in';

/** What was accepted or corrected: the ticked lines, and what was typed where nothing was read. */
export const TakeLabel = z
	.object({
		version: z.coerce.number().int(),
		reading: z.coerce.number().int().positive(),
		take: some,
		own: some,
		...(Object.fromEntries(PLATE_FIELDS.map((field) => [field, typed])) as Record<
			PlateField,
			typeof typed
		>)
	})
	.transform((form, check) => {
		const fields = PLATE_FIELDS.filter(
			(field) => form.take.includes(field) || (form.own.includes(field) && form[field] !== '')
		);
		const said: Record<string, unknown> = {};
		for (const field of fields) said[field] = form[field];
		if (fields.includes('displacementCc') && form.displacementCc !== '') {
			const read = parseDisplacement(form.displacementCc);
			if ('cc' in read) said.displacementCc = Math.round(read.cc * 10) / 10;
			else check.addIssue({ code: 'custom', path: ['displacementCc'], message: CC_SAID });
		} else if (fields.includes('displacementCc')) said.displacementCc = null;
		if (fields.length === 0)
			check.addIssue({
				code: 'custom',
				path: ['take'],
				message: 'Tick the lines that are right, then take them over.'
			});
		const kept = DonorEdit.safeParse({ ...said, version: form.version });
		if (!kept.success)
			for (const { message, path } of kept.error.issues)
				if (path[0] !== 'displacementCc' || typeof said.displacementCc === 'number')
					check.addIssue({ code: 'custom', path, message });
		return { reading: form.reading, fields, edit: kept.success ? kept.data : {} };
	});
export type TakeLabel = z.output<typeof TakeLabel>;

export const UndoTake = z.object({ event: z.coerce.number().int().positive() });
