/** What lies under a picture until it is there: a dozen points of it, in base64, drawn large. */
export const underlay = (blur: string | undefined): string | undefined =>
	blur ? `background:url(data:image/webp;base64,${blur}) center/cover` : undefined;
