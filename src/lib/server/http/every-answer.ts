import { subscribe } from 'node:diagnostics_channel';
import type { ServerResponse } from 'node:http';
import { headers } from './headers';

let begun = false;

/** The adapter serves files of the build past the hooks: these headers go on whatever leaves this process. */
export function onEveryAnswer(): void {
	if (begun) return;
	begun = true;
	const always = headers();
	subscribe('http.server.request.start', (message) => {
		const { response } = message as { response: ServerResponse };
		for (const [name, value] of always) response.setHeader(name, value);
	});
}
