import type { BinSize } from './size';

export interface BinItem {
	id: number;
	tag: string;
	address: string;
	rack: string | null;
	shelf: number | null;
	slot: number | null;
	size: BinSize;
	litres: number | null;
	/** Null when unknown, or not for this member to see. */
	yearlyCostCents: number | null;
	purpose: string;
	place: string;
	red: boolean;
	version: number;
	parts: number;
}

export interface BinPart {
	tag: string;
	kind: string;
	kindName: string;
	label: string;
	grade: string;
	state: string;
	engine: string;
}

export interface BinView extends BinItem {
	contents: BinPart[];
}
