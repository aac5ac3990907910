import type { Face } from '$lib/labels/row';
import type { Measure } from '$lib/labels/set-text';
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import PDFDocument from 'pdfkit';

const FILES: Record<Face, string> = {
	code: 'DejaVuSansMono-Bold.ttf',
	bold: 'DejaVuSansCondensed-Bold.ttf',
	plain: 'DejaVuSansCondensed.ttf'
};

const places = createRequire(import.meta.url);
const bytes = new Map<Face, Buffer>();

/** The bytes of a face, read once. */
function bytesOf(face: Face): Buffer {
	const known = bytes.get(face);
	if (known) return known;
	const read = readFileSync(places.resolve(`dejavu-fonts-ttf/ttf/${FILES[face]}`));
	bytes.set(face, read);
	return read;
}

/** An empty document that knows the faces. */
export function openPdf(title: string): PDFKit.PDFDocument {
	const pdf = new PDFDocument({ autoFirstPage: false, info: { Title: title }, margin: 0 });
	for (const face of Object.keys(FILES) as Face[]) pdf.registerFont(face, bytesOf(face));
	return pdf;
}

/** How wide texts are in the faces of a document. */
export const measureIn =
	(pdf: PDFKit.PDFDocument): Measure =>
	(text, face) =>
		pdf.font(face).fontSize(100).widthOfString(text) / 100;

/** A document as the bytes of its file, once it is ended. */
export function bytesOfPdf(pdf: PDFKit.PDFDocument): Promise<Buffer> {
	const chunks: Buffer[] = [];
	return new Promise((resolve, reject) => {
		pdf.on('data', (chunk: Buffer) => chunks.push(chunk));
		pdf.on('end', () => resolve(Buffer.concat(chunks)));
		pdf.on('error', reject);
	});
}
