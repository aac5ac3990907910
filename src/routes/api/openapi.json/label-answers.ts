import { PLATE_FIELDS } from '$lib/donors/plate-fields';
import { READING_STATES } from '$lib/donors/reading-words';
import { moment, text } from './answers';
import { z } from './row';

const share = z.number().describe('Share of the width or height of the turned photo');

const LabelOffer = z.object({
	field: z.enum(PLATE_FIELDS),
	value: text.describe('As it would be kept; ? for a character that was not made out'),
	read: text.describe('The letters on the plate'),
	legible: z.enum(['clear', 'fair', 'poor']),
	spot: z.object({ x: share, y: share, wide: share, high: share }),
	or: z.array(text).describe('Other ways to read it')
});

export const LabelReadings = z
	.object({
		items: z.array(
			z.object({
				id: z.int(),
				photoId: z.int(),
				state: z.enum(READING_STATES),
				askedAt: moment,
				turn: z.number().describe('Degrees clockwise by which the photo was turned'),
				width: z.int(),
				height: z.int(),
				offers: z.array(LabelOffer),
				lines: z.array(text)
			})
		)
	})
	.openapi('LabelReadings');
