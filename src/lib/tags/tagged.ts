/** The blank tag of an address, as the end of the search part of the next one: it stays until its thing is made. */
export function tagged(url: URL): string {
	const tag = url.searchParams.get('tag');
	return tag ? `&tag=${encodeURIComponent(tag)}` : '';
}
