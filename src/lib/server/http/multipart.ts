import { bodyRefused } from './form';

/** A file that came in a form; its bytes lie in the body that carried it. */
export interface SentFile {
	name: string;
	bytes: Buffer;
}

export interface SentForm {
	fields: Record<string, string>;
	files: Record<string, SentFile>;
}

const HEAD_END = Buffer.from('\r\n\r\n');
const LONGEST_HEAD = 4096;

/** The word under a name in the head of a part, as browsers write it. */
const said = (head: string, name: string): string | undefined =>
	new RegExp(`[;\\s]${name}="([^"]*)"`, 'i')
		.exec(head)?.[1]
		?.replace(/%(22|0D|0A)/gi, (code) => decodeURIComponent(code));

const boundaryOf = (type: string): string | undefined =>
	/^multipart\/form-data\b/i.test(type)
		? /;\s*boundary=(?:"([^"]{1,200})"|([^;\s"]{1,200}))/i.exec(type)?.slice(1).find(Boolean)
		: undefined;

function take(into: SentForm, part: Buffer): void {
	const end = part.subarray(0, LONGEST_HEAD).indexOf(HEAD_END);
	if (end < 0) throw new Error('A part of the form has no head');
	const head = part.subarray(0, end).toString('utf8');
	const bytes = part.subarray(end + HEAD_END.length);
	const [name, file] = [said(head, 'name'), said(head, 'filename')];
	if (name === undefined) throw new Error('A part of the form has no name');
	if (file === undefined) into.fields[name] ??= bytes.toString('utf8');
	else into.files[name] ??= { name: file, bytes };
}

/** Takes a form with files apart where it lies, without copying what is in it. The first of a name counts. */
export function splitForm(body: Buffer, type: string): SentForm {
	const boundary = boundaryOf(type);
	if (!boundary) throw new Error('This is no form with files');
	const [first, next] = [Buffer.from(`--${boundary}`), Buffer.from(`\r\n--${boundary}`)];
	const form: SentForm = { fields: Object.create(null), files: Object.create(null) };
	let at = body.indexOf(first);
	if (at !== 0 && body.subarray(at - 2, at).toString() !== '\r\n') throw new Error('No first part');
	at += first.length;
	while (body.subarray(at, at + 2).toString() !== '--') {
		const end = body.indexOf(next, at);
		if (end < 0) throw new Error('The form breaks off');
		take(form, body.subarray(body.indexOf('\r\n', at) + 2, end));
		at = end + next.length;
	}
	return form;
}

/** Reads a form that carries a photo: quicker, and with less memory, than the general way. */
export async function readPhotoForm(request: Request): Promise<SentForm> {
	try {
		const type = request.headers.get('content-type') ?? '';
		return splitForm(Buffer.from(await request.arrayBuffer()), type);
	} catch (fault) {
		throw bodyRefused(fault, 'Send the fields as a form.');
	}
}
