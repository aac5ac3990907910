const BEAT_MS = 15_000;
/** Whoever looks on must pass the door again after this long. */
const LIFE_MS = 60_000;

const open = new Set<() => void>();

/** Ends every stream, so that the process can stop. */
export const endStreams = (): void => open.forEach((end) => end());

/**
 * A stream that says "changed" each time something did, and nothing else: what changed is asked for at its
 * own door. Beats keep proxies from closing it; it ends by itself and the browser opens it again.
 */
export function changeStream(watch: (hear: () => void) => () => void): Response {
	const bytes = new TextEncoder();
	const atEnd: (() => void)[] = [];
	const leave = () => atEnd.splice(0).forEach((each) => each());
	const body = new ReadableStream<Uint8Array>({
		start(out) {
			const say = (text: string) => out.enqueue(bytes.encode(text));
			const end = () => {
				leave();
				out.close();
			};
			const stop = watch(() => say('event: changed\ndata:\n\n'));
			const beat = setInterval(() => say(': still here\n\n'), BEAT_MS);
			const life = setTimeout(end, LIFE_MS);
			open.add(end);
			atEnd.push(
				stop,
				() => clearInterval(beat),
				() => clearTimeout(life),
				() => open.delete(end)
			);
			say('retry: 1000\n\n');
		},
		cancel: leave
	});
	return new Response(body, {
		headers: {
			'Content-Type': 'text/event-stream',
			'Cache-Control': 'no-cache, no-transform',
			'X-Accel-Buffering': 'no'
		}
	});
}
