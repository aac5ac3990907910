export const PHOTO_SIZES = ['thumb', 'card', 'full'] as const;
export type PhotoSize = (typeof PHOTO_SIZES)[number];

export type PhotoLinks = Record<PhotoSize, string>;

/** Where the sizes of a photo are served, to members of its shop only. */
export function photoLinks(shopSlug: string, id: number): PhotoLinks {
	const at = (size: PhotoSize) => `/api/${shopSlug}/photos/${id}/${size}`;
	return { thumb: at('thumb'), card: at('card'), full: at('full') };
}

export const isPhotoSize = (said: string): said is PhotoSize =>
	(PHOTO_SIZES as readonly string[]).includes(said);
