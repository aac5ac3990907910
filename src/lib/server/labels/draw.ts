import type { Piece } from '$lib/labels/piece';
import type { Stock } from '$lib/labels/stocks';

const POINT = 72 / 25.4;
const pt = (mm: number) => mm * POINT;

/** The pieces of a label, in black, at a place on the page. */
export function drawPieces(
	pdf: PDFKit.PDFDocument,
	pieces: readonly Piece[],
	left: number,
	top: number
): void {
	pdf.save().translate(pt(left), pt(top)).fillColor('#000').strokeColor('#000');
	for (const piece of pieces) drawPiece(pdf, piece);
	pdf.restore();
}

function drawPiece(pdf: PDFKit.PDFDocument, piece: Piece): void {
	const { x, y, width, height } = piece;
	if (piece.what === 'qr') {
		pdf.save().translate(pt(x), pt(y)).scale(pt(piece.dot)).path(piece.path).fill('#000').restore();
	} else if (piece.what === 'text') {
		const options = { lineBreak: false, baseline: 'alphabetic' as const };
		pdf
			.font(piece.face)
			.fontSize(pt(piece.size))
			.text(piece.text, pt(x), pt(piece.baseline), options);
	} else if (piece.what === 'line') {
		pdf.rect(pt(x), pt(y), pt(width), pt(height)).fill('#000');
	} else if (piece.what === 'frame') {
		pdf.lineWidth(pt(0.35)).rect(pt(x), pt(y), pt(width), pt(height)).stroke();
	} else {
		const [cx, cy] = [pt(x + width / 2), pt(y + height / 2)];
		pdf
			.lineWidth(pt(0.25))
			.circle(cx, cy, pt(width / 2) - 1)
			.stroke();
		pdf
			.moveTo(cx - 3, cy)
			.lineTo(cx + 3, cy)
			.moveTo(cx, cy - 3)
			.lineTo(cx, cy + 3)
			.stroke();
	}
}

/** Dashes round a label: to cut along, or to see where it lies. */
export function drawOutline(
	pdf: PDFKit.PDFDocument,
	{ measures }: Stock,
	x: number,
	y: number
): void {
	pdf.save().lineWidth(0.4).strokeColor('#777').dash(3, { space: 3 });
	pdf.rect(pt(x), pt(y), pt(measures.width), pt(measures.height)).stroke().restore();
}

/** Which place on the sheet this is. */
export function drawNumber(pdf: PDFKit.PDFDocument, at: number, x: number, y: number): void {
	pdf.font('bold').fontSize(pt(8)).fillColor('#000');
	pdf.text(String(at), pt(x + 3), pt(y + 3), { lineBreak: false });
}

export const addPage = (pdf: PDFKit.PDFDocument, { measures }: Stock): void => {
	pdf.addPage({ size: [pt(measures.pageWidth), pt(measures.pageHeight)], margin: 0 });
};
