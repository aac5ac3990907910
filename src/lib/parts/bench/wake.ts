import { BenchAnswers } from './answers.svelte';
import { onPhone } from './queue';
import { sendAnswer } from './send';

/** Sends what the bench left on this phone, from whatever page is open. */
export function wake(shop: string, person: string) {
	const answers = new BenchAnswers({ shop, person }, onPhone(), {
		send: sendAnswer,
		taken: () => {},
		now: () => Date.now(),
		later: (work, ms) => {
			const timer = setTimeout(work, ms);
			return () => clearTimeout(timer);
		}
	});
	const online = () => void answers.send();
	addEventListener('online', online);
	const close = () => {
		removeEventListener('online', online);
		answers.stop();
	};
	return { answers, close };
}
