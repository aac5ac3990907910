/** A photo that was taken away and can still be put back. */
export interface PhotoRemoved {
	id: number;
	alt: string;
	at: Date;
	by: string;
	thumb: string;
}
