import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readPhotoForm, splitForm } from './multipart';

const name = fc.string({ minLength: 1, maxLength: 12 }).filter((one) => /^[a-z]+$/.test(one));
const names = fc.oneof(name, fc.constantFrom('file', 'shot', 'of'));
const words = fc.string({ maxLength: 40 }).map((one) => one.replace(/\r\n?|\n/g, '\r\n'));
const called = fc.string({ minLength: 1, maxLength: 20, unit: 'grapheme' });

/** What the platform's own reader makes of the same body. */
async function byPlatform(body: FormData) {
	const request = new Request('http://localhost/', { method: 'POST', body });
	const type = request.headers.get('content-type') ?? '';
	const bytes = Buffer.from(await request.clone().arrayBuffer());
	return { form: await request.formData(), bytes, type };
}

describe('a form with files', () => {
	it('is read like the platform reads it', async () => {
		const fields = fc.dictionary(names, words, { maxKeys: 4 });
		const files = fc.dictionary(names, fc.tuple(called, fc.uint8Array({ maxLength: 300 })), {
			maxKeys: 3
		});
		await fc.assert(
			fc.asyncProperty(fields, files, async (typed, sent) => {
				const body = new FormData();
				for (const [key, value] of Object.entries(typed)) body.append(key, value);
				for (const [key, [file, bytes]] of Object.entries(sent))
					body.append(`f${key}`, new File([new Uint8Array(bytes)], file));
				const { form, bytes, type } = await byPlatform(body);
				const read = splitForm(bytes, type);
				for (const [key, value] of form.entries())
					if (typeof value === 'string') expect(read.fields[key]).toBe(value);
					else
						expect(read.files[key]?.bytes.equals(Buffer.from(await value.arrayBuffer()))).toBe(
							true
						);
				const found = Object.keys(read.fields).length + Object.keys(read.files).length;
				expect(found).toBe([...new Set(form.keys())].length);
			})
		);
	});

	it('whose file holds what looks like its own border is still whole', () => {
		const inside = 'x\r\n--other\r\n--bo';
		const body = `--border\r\nContent-Disposition: form-data; name="file"; filename="a"\r\n\r\n${inside}\r\n--border--\r\n`;
		const { files } = splitForm(Buffer.from(body), 'multipart/form-data; boundary=border');
		expect(files.file?.bytes.toString()).toBe(inside);
	});

	it('that is broken anywhere is refused, never read in part', () => {
		const body = Buffer.from(
			'--b\r\nContent-Disposition: form-data; name="file"; filename="a"\r\n\r\nphoto\r\n--b--\r\n'
		);
		fc.assert(
			fc.property(fc.integer({ min: 0, max: body.length - 5 }), (length) => {
				expect(() =>
					splitForm(body.subarray(0, length), 'multipart/form-data; boundary=b')
				).toThrow();
			})
		);
	});

	it('of another kind is refused in words', async () => {
		for (const type of ['application/json', 'multipart/form-data', 'text/plain; boundary=b']) {
			const request = new Request('http://localhost/', {
				method: 'POST',
				body: '{}',
				headers: { 'content-type': type }
			});
			await expect(readPhotoForm(request)).rejects.toMatchObject({
				name: 'Refused',
				message: 'Send the fields as a form.'
			});
		}
	});
});
