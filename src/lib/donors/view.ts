import type { PhotoLinks } from '$lib/photos/links';
import type { Gate } from './state';
import type { Todo } from './todo';
import type { DonorShot, DonorState, ReleaseRoute, Shaft, Sureness } from './words';

/** A donor in a list: a tag card. */
export interface DonorItem {
	id: number;
	number: string;
	tag: string;
	engine: string;
	state: DonorState;
	class: string | null;
	cause: string | null;
	causeSaid: string;
	sureness: Sureness | null;
	offMachine: string;
	takenInAt: string;
	partCount: number;
	photo: PhotoLinks | null;
	/** That photo as a tiny picture, in base64; '' without one. */
	blur: string;
	todo: Todo[];
}

export interface DonorPhotoView {
	id: number;
	shot: DonorShot;
	alt: string;
	/** A dozen points of it as a tiny picture, in base64. */
	blur: string;
	links: PhotoLinks;
}

export interface ReleaseView {
	route: ReleaseRoute;
	document: string;
	on: string;
	holdUntil: string | null;
	by: string;
}

export interface DonorPart {
	id: number;
	tag: string;
	kind: string;
	kindName: string;
	label: string;
	grade: string;
	state: string;
	/** The address of its bin, or the tag of its box. */
	place: string | null;
}

export interface DonorEvent {
	at: string;
	by: string;
	said: string;
}

export interface DonorView extends DonorItem {
	maker: string;
	model: string;
	typeCode: string;
	dateCode: string;
	serial: string;
	/** As it stands on the emission label. */
	emissionFamily: string;
	displacementCc: number | null;
	shaft: Shaft | null;
	fittings: string[];
	secondCause: string | null;
	safeTicks: string[];
	note: string;
	/** Only for those who see costs. */
	paidCents?: number;
	strippedAt: string | null;
	version: number;
	boxes: { tag: string }[];
	photos: DonorPhotoView[];
	release: ReleaseView | null;
	gates: Gate[];
	parts: DonorPart[];
	events: DonorEvent[];
}
