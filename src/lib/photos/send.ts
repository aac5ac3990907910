export interface Outgoing {
	/** Made once per photo, so that a photo sent twice is kept once. */
	key: string;
	file: File;
	shot: string;
}

const LOST = 'The photo did not arrive. Send it again.';

/** Sends one photo by itself; `onShare` hears how much of it has gone, 0 to 1. */
export function sendPhoto(
	api: string,
	{ key, file, shot }: Outgoing,
	onShare: (share: number) => void
): Promise<void> {
	return new Promise((done, fail) => {
		const request = new XMLHttpRequest();
		const form = new FormData();
		form.append('file', file);
		if (shot) form.append('shot', shot);
		request.open('POST', api);
		request.responseType = 'json';
		request.setRequestHeader('Idempotency-Key', key);
		request.upload.onprogress = ({ lengthComputable, loaded, total }) => {
			if (lengthComputable) onShare(loaded / total);
		};
		request.onload = () =>
			request.status < 300 ? done() : fail(new Error(request.response?.message ?? LOST));
		request.onerror = () => fail(new Error(LOST));
		request.send(form);
	});
}
