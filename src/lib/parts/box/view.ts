import type { DonorShot } from '$lib/donors/words';
import type { PhotoLinks } from '$lib/photos/links';
import type { PartState } from '../words';

export interface PinPart {
	tag: string;
	label: string;
	grade: string;
	state: PartState;
	/** The address of its bin, or the tag of its box. */
	place: string | null;
}

/** A pin on a photo; without a part it marks a kind still to be pulled. */
export interface PinView {
	id: number;
	/** The id of its photo. */
	photo: number;
	/** The number that stands on it. */
	n: number;
	x: number;
	y: number;
	kind: string;
	kindName: string;
	part: PinPart | null;
}

export interface RulerView {
	x1: number;
	y1: number;
	x2: number;
	y2: number;
	mm: number;
	/** As it was typed. */
	said: string;
}

export interface PinnedPhoto {
	id: number;
	shot: DonorShot;
	alt: string;
	links: PhotoLinks;
	width: number;
	height: number;
	/** A tiny picture until the photo is there. */
	blur: string;
	takenAt: Date;
	pins: PinView[];
	ruler: RulerView | null;
}

/** Where a part is seen on a photo of its donor. */
export interface PinOnPhoto {
	n: number;
	photo: number;
	shot: DonorShot;
	donor: string;
	thumb: string;
}
