import { readdirSync, readFileSync, readlinkSync } from 'node:fs';

const lines = (path: string) => {
	try {
		return readFileSync(path, 'utf8').split('\n');
	} catch {
		return [];
	}
};

/** The inodes of the sockets that listen on a port. */
function listening(port: number): string[] {
	const hex = port.toString(16).toUpperCase().padStart(4, '0');
	return ['/proc/net/tcp', '/proc/net/tcp6'].flatMap((table) =>
		lines(table)
			.map((line) => line.trim().split(/\s+/))
			.filter(([, local, , state]) => local?.endsWith(`:${hex}`) && state === '0A')
			.map((fields) => fields[9] ?? '')
	);
}

const holds = (pid: string, sockets: string[]): boolean => {
	try {
		return readdirSync(`/proc/${pid}/fd`).some((fd) =>
			sockets.includes(/^socket:\[(\d+)\]$/.exec(readlinkSync(`/proc/${pid}/fd/${fd}`))?.[1] ?? '-')
		);
	} catch {
		return false;
	}
};

/** The process that listens on a port of this machine. */
export function processOn(port: number): number {
	const sockets = listening(port);
	const pid = readdirSync('/proc').find((name) => /^\d+$/.test(name) && holds(name, sockets));
	if (!pid) throw new Error(`No process of ours listens on port ${port}`);
	return Number(pid);
}

/** The memory that a process holds now, in MB. */
export function memoryOf(pid: number): number {
	const line = lines(`/proc/${pid}/status`).find((one) => one.startsWith('VmRSS:'));
	return Number(/\d+/.exec(line ?? '')?.[0] ?? 0) / 1024;
}

/** Watches a server while a work goes on: how much its memory grew at most, and how long /livez took, in ms. */
export async function watched(base: string, work: () => Promise<unknown>) {
	const pid = processOn(Number(new URL(base).port));
	const before = memoryOf(pid);
	let [most, on] = [before, true];
	const waits: number[] = [];
	const watch = (async () => {
		while (on) {
			const began = performance.now();
			await fetch(`${base}/livez`).then((answer) => answer.text());
			waits.push(performance.now() - began);
			most = Math.max(most, memoryOf(pid));
			await new Promise((done) => setTimeout(done, 10));
		}
	})();
	try {
		await work();
	} finally {
		on = false;
		await watch;
	}
	return { grown: most - before, waits: waits.sort((a, b) => a - b) };
}
