/** A fresh key for one change. (randomUUID is missing where a phone reaches the shop without TLS.) */
export function onceKey(): string {
	const bytes = crypto.getRandomValues(new Uint8Array(16));
	return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}
