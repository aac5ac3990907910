/** What a photo may be; the server decides by the bytes, the browser only helps to choose. */
export const PHOTO_BYTES = 25 * 1024 * 1024;
export const PHOTO_PIXELS = 60_000_000;
export const PHOTO_ACCEPT = 'image/jpeg,image/png,image/webp,image/avif';

export const PHOTO_SAID = {
	size: 'This photo is larger than 25 MB. Take it at a lower setting or choose another.',
	pixels: 'This photo has more than 60 megapixels. Take it at a lower setting or choose another.',
	kind: 'This is not a photo that can be kept. Choose a JPEG, PNG, WebP or AVIF.',
	heic: 'This is a HEIC photo. Set the camera to JPEG, or choose a JPEG, PNG, WebP or AVIF.',
	broken: 'This photo breaks off in the middle. Take it again or choose another.'
} as const;

export const PHOTO_NONE = 'Choose a photo first.';
