import { expect, it, vi } from 'vitest';
import { Uploads, type Send } from './uploads.svelte';

const files = (count: number) =>
	Array.from({ length: count }, (_, at) => new File(['x'], `${at}.jpg`));

/** A wire that answers when told to. */
function wire() {
	const going = new Map<string, { arrive: () => void; fail: (fault: Error) => void }>();
	const sent: string[] = [];
	const send: Send = ({ file, key }) =>
		new Promise((arrive, fail) => {
			sent.push(key);
			going.set(file.name, { arrive, fail });
		});
	return { going, sent, send };
}

const settle = () => new Promise((done) => setTimeout(done));

it('sends two at a time, each under a key of its own', async () => {
	const { going, sent, send } = wire();
	const uploads = new Uploads(send);
	uploads.add(files(5), 'front', () => '');
	expect([...going.keys()]).toEqual(['0.jpg', '1.jpg']);
	going.get('0.jpg')?.arrive();
	await settle();
	expect([...going.keys()]).toEqual(['0.jpg', '1.jpg', '2.jpg']);
	expect(new Set(sent).size).toBe(3);
});

it('a failed one stops no other, and goes again under the same key', async () => {
	const { going, sent, send } = wire();
	const uploads = new Uploads(send);
	uploads.add(files(3), '', () => '');
	going.get('0.jpg')?.fail(new Error('This is not a photo.'));
	going.get('1.jpg')?.arrive();
	await settle();
	going.get('2.jpg')?.arrive();
	await settle();
	expect(uploads.list.map((one) => one.state)).toEqual(['failed', 'sent', 'sent']);
	expect(uploads.list[0]?.said).toBe('This is not a photo.');
	const failed = uploads.list[0]?.key ?? '';
	uploads.retry(failed);
	expect(sent.filter((key) => key === failed)).toHaveLength(2);
	going.get('0.jpg')?.arrive();
	await settle();
	expect(uploads.list[0]?.state).toBe('sent');
});

it('tells once when the tray is at rest, and clears what was sent', async () => {
	const { going, send } = wire();
	const idle = vi.fn();
	const uploads = new Uploads(send, idle);
	uploads.add(files(2), '', (file) => `blob:${file.name}`);
	going.get('0.jpg')?.arrive();
	await settle();
	expect(idle).not.toHaveBeenCalled();
	going.get('1.jpg')?.fail(new Error('lost'));
	await settle();
	expect(idle).toHaveBeenCalledTimes(1);
	expect(uploads.clear().map((one) => one.preview)).toEqual(['blob:0.jpg']);
	expect(uploads.list.map((one) => one.state)).toEqual(['failed']);
});
