import type { Answer, WaitingPhoto } from './waiting';

interface Told {
	message?: unknown;
}

function answerOf(request: XMLHttpRequest): Answer {
	const told: Told | null = request.response;
	const after = Number(request.getResponseHeader('retry-after'));
	return {
		status: request.status,
		...(typeof told?.message === 'string' ? { message: told.message } : {}),
		...(after > 0 ? { after } : {})
	};
}

/** Sends one photo by itself; `onShare` hears how much of it has gone, 0 to 1. Status 0: nothing came back. */
export function sendPhoto(
	photo: WaitingPhoto,
	body: Blob,
	onShare: (share: number) => void
): Promise<Answer> {
	return new Promise((done) => {
		const request = new XMLHttpRequest();
		const form = new FormData();
		form.append('file', body, photo.file);
		if (photo.shot) form.append('shot', photo.shot);
		for (const [name, value] of Object.entries(photo.fields ?? {})) form.append(name, value);
		request.open('POST', photo.api);
		request.responseType = 'json';
		request.timeout = 5 * 60_000;
		request.setRequestHeader('Idempotency-Key', photo.key);
		request.setRequestHeader('Photo-Taken-By', photo.person);
		request.upload.onprogress = ({ lengthComputable, loaded, total }) => {
			if (lengthComputable) onShare(loaded / total);
		};
		request.onload = () => done(answerOf(request));
		request.onerror = request.ontimeout = () => done({ status: 0 });
		request.send(form);
	});
}

export type Send = typeof sendPhoto;
