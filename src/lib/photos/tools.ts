import type { OnPhone } from './on-phone';
import type { Send } from './send';
import type { Shrink } from './shrink';

/** What a tray works with; tests bring their own phone, wire and clock. */
export interface Tools {
	phone: OnPhone;
	send: Send;
	shrink: Shrink;
	now(): number;
	chance(): number;
	/** Calls back once, after so many ms. */
	later(ms: number, call: () => void): void;
	link(picture: Blob): string;
	unlink(link: string): void;
	/** Runs a work unless another page of this phone is at it: then null. */
	alone<T>(name: string, work: () => Promise<T>): Promise<T | null>;
	/** Tells the other pages of this phone that something changed. */
	tell(): void;
}
