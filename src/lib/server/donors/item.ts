import { sayEngine, sayNumber } from '$lib/donors/reference';
import { todoOf } from '$lib/donors/todo';
import type { DonorItem } from '$lib/donors/view';
import { photoLinks } from '$lib/photos/links';
import { causeSaid, isCauseId } from '$lib/trade';
import type { Around } from './around';
import type { DonorRow } from './rows';

const said = (cause: string) => (isCauseId(cause) ? causeSaid(cause) : cause);

/** The causes of a donor in words, the first one first; '' when nobody has named one. */
export const causesSaid = ({ cause, secondCause }: DonorRow): string =>
	[cause, secondCause]
		.filter((one) => one !== null)
		.map(said)
		.join(' and ');

export function donorItem(row: DonorRow, near: Around, slug: string, today: string): DonorItem {
	const photos = near.photos.filter((photo) => photo.donorId === row.id);
	const release = near.releases.get(row.id) ?? null;
	const shots = photos.map((photo) => photo.shot);
	const first = photos.find((photo) => photo.shot === 'front') ?? photos[0];
	return {
		id: row.id,
		number: sayNumber(row.number),
		tag: near.boxes.find((box) => box.donorId === row.id)?.tag ?? '',
		engine: sayEngine(row),
		state: row.state,
		class: row.engineClass,
		cause: row.cause,
		causeSaid: causesSaid(row),
		sureness: row.sureness,
		offMachine: row.offMachine,
		takenInAt: row.takenInAt.toISOString(),
		partCount: near.parts.get(row.id) ?? 0,
		photo: first ? photoLinks(slug, first.id) : null,
		blur: first?.blur ?? '',
		todo: todoOf(row, release, shots, today)
	};
}
