import { z } from 'zod';

/** One photo of a multipart upload, by the name its field has. */
export const PhotoFile = z.instanceof(File, { error: 'Choose a photo' });
