import { goto } from '$app/navigation';
import { plural } from '$lib/format';
import type { PutAwayDone } from '$lib/parts/view';
import { onceKey } from '$lib/people/once-key';
import { readScan, sayScan } from '$lib/scan/read';
import { signal } from '$lib/scan/signal';
import { inHand, seenPlace, type InHand, type Seen, type Tagged } from './in-hand';

const OFFLINE = 'There is no connection. What is in hand stays here: scan again when there is one.';

interface Refusal {
	message?: string;
}

/** What is in hand, and what the scans do: parts gather, a bin or a box takes them. */
export class Hand {
	parts = $state<InHand[]>([]);
	seen = $state<Seen | null>(null);
	said = $state('');
	wrong = $state('');
	/** The events of what was put away last, to be taken back. */
	undo = $state<number[]>([]);
	/** How many were put away since the scanner was opened. */
	count = $state(0);
	busy = $state(0);
	#line: Promise<void> = Promise.resolve();

	constructor(
		readonly slug: string,
		readonly work: boolean,
		first: readonly InHand[]
	) {
		this.parts = [...first];
	}

	/** Scans wait in line, so that a bin takes what was scanned before it, however fast the hand is. */
	scanned(text: string): void {
		const scan = readScan(text, this.slug);
		const no = sayScan(scan);
		if (no !== null || !('tag' in scan)) return this.#fail(no ?? '');
		signal('good');
		this.busy++;
		this.#line = this.#line
			.then(() => this.#take(scan.tag))
			.catch(() => this.#fail(OFFLINE))
			.finally(() => this.busy--);
	}

	putDown(tag: string): void {
		this.parts = this.parts.filter((part) => part.tag !== tag);
	}

	undone(many: number): void {
		this.count -= many;
		this.undo = [];
		this.said = `${plural(many, 'part is', 'parts are')} where ${many === 1 ? 'it was' : 'they were'}`;
	}

	#fail(said: string): void {
		this.wrong = said;
		signal('bad');
	}

	async #take(tag: string): Promise<void> {
		this.wrong = '';
		if (this.parts.some((part) => part.tag === tag)) return;
		const answer = await fetch(`/api/${this.slug}/tags/${tag}`);
		if (answer.status === 404)
			return this.#fail(`No box, part or bin of this shop carries ${tag}.`);
		if (!answer.ok) return this.#fail(await refusal(answer));
		const found: Tagged = await answer.json();
		if (found.what === 'blank') return goto(`/${this.slug}/tags/${found.code}`);
		if (found.what === 'part') this.#pickUp(inHand(found.part));
		else if (this.parts.length > 0 && this.work) await this.#put(found.code);
		else this.seen = seenPlace(`/${this.slug}`, found);
	}

	#pickUp(part: InHand): void {
		this.seen = null;
		this.said = `${part.tag}: ${part.name}`;
		this.parts = this.work ? [part, ...this.parts] : [part];
	}

	async #put(bin: string): Promise<void> {
		const parts = this.parts.map((part) => part.tag);
		const answer = await fetch(`/api/${this.slug}/put-away`, {
			method: 'POST',
			headers: { 'content-type': 'application/json', 'idempotency-key': onceKey() },
			body: JSON.stringify({ parts, bin })
		});
		if (!answer.ok) return this.#fail(await refusal(answer));
		this.#putDone(await answer.json());
	}

	#putDone({ to, put, there, refused }: PutAwayDone): void {
		const stays = refused.map((one) => one.tag);
		this.parts = this.parts.filter((part) => stays.includes(part.tag));
		this.undo = put.map((one) => one.eventId);
		this.count += put.length;
		const already = there.length > 0 ? `, ${there.length} lay there already` : '';
		this.said = `${plural(put.length, 'part', 'parts')} put away in ${to}${already}`;
		if (refused.length === 0) return signal('done');
		this.#fail(refused.map(({ tag, said }) => `${tag} stays in hand: ${said}`).join(' '));
	}
}

const refusal = async (answer: Response): Promise<string> =>
	((await answer.json().catch(() => ({}))) as Refusal).message ?? OFFLINE;
