/** What a photo may be; the server decides by the bytes, the browser only helps to choose. */
export const PHOTO_BYTES = 25 * 1024 * 1024;
export const PHOTO_PIXELS = 60_000_000;
/** HEIC is decoded by a slower road, in a thread of its own. */
export const HEIC_PIXELS = 16_777_216;
export const PHOTO_ACCEPT = 'image/jpeg,image/png,image/webp,image/avif';
/** For choosing what is there already. A camera is not told of HEIC: asked for JPEG, a phone makes one. */
export const GALLERY_ACCEPT = `${PHOTO_ACCEPT},image/heic,image/heif,.heic,.heif`;
/** So many may be dropped or chosen at once. */
export const PHOTOS_AT_ONCE = 50;

export const PHOTO_SAID = {
	size: 'This photo is larger than 25 MB. Take it at a lower setting or choose another.',
	pixels: 'This photo has more than 60 megapixels. Take it at a lower setting or choose another.',
	kind: 'This is not a photo that can be kept. Choose a JPEG, PNG, WebP, AVIF or HEIC.',
	heic: 'This HEIC photo has more than 16 megapixels. Set the camera to JPEG or to fewer megapixels.',
	taker:
		'This photo was taken under another sign-in. Sign in as the one who took it, then send it again.',
	broken: 'This photo breaks off in the middle. Take it again or choose another.'
} as const;

export const PHOTO_NONE = 'Choose a photo first.';
