import type { Grade, PartState } from '../words';
import type { Waiting } from './queue';

/** The part that was made of it, with its tag; null for a kind that was left on. */
export interface Taken {
	tag: string;
	grade: Grade;
	state: PartState;
	bin: string | null;
	destroyed: boolean;
	history: { id: number }[];
}

/** What became of a sent answer: taken, refused in words, or lost on the way and to be sent again. */
export type Sent = { taken: Taken | null } | { refused: string } | { lost: true };

const REFUSED = [400, 403, 404, 409, 422];

function call({ shop, donor, answer }: Waiting): { url: string; body: unknown } {
	const at = `/api/${shop}/donors/${donor}`;
	return answer.what === 'leave'
		? { url: `${at}/leave`, body: { kind: answer.kind } }
		: { url: `${at}/parts`, body: answer.body };
}

/** Sends one answer. Signed out, busy or broken, the shop may still take it later: then it is lost, not refused. */
export async function sendAnswer(one: Waiting): Promise<Sent> {
	const { url, body } = call(one);
	try {
		const response = await fetch(url, {
			method: 'POST',
			headers: { 'Content-Type': 'application/json', 'Idempotency-Key': one.key },
			body: JSON.stringify(body)
		});
		if (response.ok) return { taken: one.answer.what === 'log' ? await response.json() : null };
		if (!REFUSED.includes(response.status)) return { lost: true };
		const { message } = (await response.json()) as { message: string };
		return { refused: message };
	} catch {
		return { lost: true };
	}
}
