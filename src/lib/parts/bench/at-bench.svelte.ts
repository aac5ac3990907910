import { onceKey } from '$lib/people/once-key';
import { answerIn, keeps, type Fields, type Problem } from './answer';
import { BenchAnswers, type Bench } from './answers.svelte';
import { LiveBench } from './live.svelte';
import { shown, stillOn } from './next';
import { onPhone, type Store } from './queue';
import { sendAnswer } from './send';
import type { BenchDone, BenchKind, BenchView } from './view';

/** A tap that follows so soon was meant for the part before. */
const SETTLE_MS = 350;
const NO_SIGNAL = 'There is no signal. Try this again when there is one.';

function fieldsOf(form: HTMLFormElement, submitter: HTMLElement | null): Fields {
	const data = new FormData(form, submitter);
	return Object.fromEntries(
		[...new Set(data.keys())].map((name) => {
			const values = data.getAll(name).filter((value) => value !== '');
			return [name, values.length > 1 ? values : values[0]];
		})
	);
}

/** One phone at one donor: what is before the person, what was answered, what others did. */
export class AtBench {
	live: LiveBench;
	answers: BenchAnswers;
	problems = $state.raw<Problem[]>([]);
	/** The next part has only just come up: a tap now was meant for the one before. */
	settling = $state(false);

	/** The kind before the person's eyes. */
	#before = $state.raw<{ kind: string; kindName: string } | null>(null);
	#chosen: string | null = null;
	#store: Store;

	constructor(
		view: BenchView,
		private readonly where: Required<Bench>
	) {
		this.live = new LiveBench(view, this.#addresses(view), (seen) => this.#see(seen));
		this.#store = onPhone();
		this.answers = new BenchAnswers(where, this.#store, {
			send: sendAnswer,
			taken: (one, made) => this.live.taken(one, made),
			now: () => Date.now(),
			later: (work, ms) => {
				const timer = setTimeout(work, ms);
				return () => clearTimeout(timer);
			}
		});
	}

	kinds = $derived.by(() => stillOn(this.live.view, this.answers.list));
	#shown = $derived.by(() => shown(this.kinds, this.#before?.kind ?? null));
	next: BenchKind | null = $derived.by(() => this.#shown.next);

	/** The last part that this phone logged: its tag is to be written on it. */
	tagged = $derived.by(
		() => this.live.view.done.find((one) => one.mine && one.state !== 'scrapped') ?? null
	);

	/** What was before the person's eyes and was answered by somebody else. */
	gone = $derived.by(() => {
		if (!this.#shown.gone || !this.#before) return null;
		const { kind, kindName } = this.#before;
		const off = this.live.view.done.find((one) => one.kind === kind);
		const left = this.live.view.leftOn.find((one) => one.kind === kind);
		const said = off
			? `${off.by} logged it just now: ${off.tag}.`
			: `${left?.by ?? 'Somebody'} left it on just now.`;
		return { kindName, said };
	});

	#addresses(view: BenchView) {
		const at = `/api/${this.where.shop}/donors/${view.number}/bench`;
		const minutes = view.minutesAtHand === null ? '' : `?minutes=${view.minutesAtHand}`;
		return { api: at + minutes, stream: `${at}/live` };
	}

	/** The page brought a bench anew, perhaps with other minutes or another kind to show. */
	renew(view: BenchView, chosen: string | null): void {
		this.live.where = this.#addresses(view);
		this.live.view = view;
		if (chosen === this.#chosen) return;
		this.#chosen = chosen;
		this.#before = view.kinds.find(({ kind }) => kind === chosen) ?? null;
	}

	get #whose() {
		const { shop, person, donor } = this.where;
		return [shop, person, donor].join(' ');
	}

	#see(view: BenchView): void {
		void this.#store.see(this.#whose, view);
	}

	/** A page that the phone kept from earlier is older than what the phone has seen since. */
	async #recall(): Promise<void> {
		const seen = await this.#store.seen(this.#whose);
		if (seen && Date.parse(seen.asOf) > Date.parse(this.live.view.asOf)) this.live.view = seen;
		else this.#see(this.live.view);
	}

	/** What is shown stays until it is answered. */
	keepInSight(): void {
		if (this.#before === null && this.next) this.#before = this.next;
	}

	/** Takes up what this phone still keeps, and begins to hear of what others do. */
	open(): () => void {
		const online = () => void this.answers.send();
		void this.#recall();
		void this.answers.load();
		this.live.watch();
		addEventListener('online', online);
		return () => {
			removeEventListener('online', online);
			this.answers.stop();
			this.live.stop();
		};
	}

	goOn(): void {
		this.#before = null;
		this.settling = true;
		setTimeout(() => (this.settling = false), SETTLE_MS);
		scrollTo({ top: 0 });
	}

	answer = (event: SubmitEvent & { currentTarget: HTMLFormElement }): void => {
		event.preventDefault();
		const one = this.next;
		if (!one || this.settling) return;
		const fields = fieldsOf(event.currentTarget, event.submitter);
		const read = answerIn(fields, one.set);
		this.problems = 'problems' in read ? read.problems : this.#unticked(one, read.answer, fields);
		if ('problems' in read || this.problems.length > 0) return;
		void this.answers.add(this.where.donor, read.answer, one.kindName);
		this.goOn();
	};

	#unticked(one: BenchKind, answer: Parameters<typeof keeps>[0], fields: Fields): Problem[] {
		const ticked = [fields.checklist ?? []].flat();
		const left = one.checklist.filter((line) => !ticked.includes(line));
		if (!keeps(answer) || left.length === 0) return [];
		const message = `${one.kindName} is kept only through its checklist. Still to tick: ${left.length}`;
		return [{ field: 'checklist', message }];
	}

	undo = (one: BenchDone): Promise<void> =>
		this.#change(`parts/${one.tag}/undo`, { event: one.undo }, `undo-${one.undo}`);

	takeUp = (kind: string): Promise<void> =>
		this.#change(`donors/${this.where.donor}/take-up`, { kind }, onceKey());

	async #change(path: string, body: unknown, key: string): Promise<void> {
		this.problems = [];
		try {
			const answer = await fetch(`/api/${this.where.shop}/${path}`, {
				method: 'POST',
				headers: { 'Content-Type': 'application/json', 'Idempotency-Key': key },
				body: JSON.stringify(body)
			});
			const { message } = await answer.json();
			if (!answer.ok) this.problems = [{ field: 'next', message }];
			await this.live.read();
		} catch {
			this.problems = [{ field: 'next', message: NO_SIGNAL }];
		}
	}
}
