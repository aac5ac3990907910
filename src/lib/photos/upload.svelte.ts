import type { WaitingPhoto } from './waiting';

export type UploadState = 'shrinking' | 'waits' | 'going' | 'sent' | 'failed' | 'dropped';

/** One photo of the tray, as screens show it. */
export class Upload {
	state = $state<UploadState>('shrinking');
	/** How much of it has gone, 0 to 1. */
	share = $state(0);
	/** Why it has not gone. */
	said = $state('');
	/** Address of its small picture; '' until there is one. */
	preview = $state('');
	/** Whether it would outlive this page. */
	kept = $state(false);
	/** Its bytes, for where the phone keeps none. */
	body: Blob | undefined;

	constructor(public photo: WaitingPhoto) {
		this.said = photo.said;
		if (photo.failed) this.state = 'failed';
		else if (photo.ready) this.state = 'waits';
	}

	get key(): string {
		return this.photo.key;
	}

	/** Still on this phone, and nowhere else. */
	get waiting(): boolean {
		return this.state !== 'sent' && this.state !== 'dropped';
	}
}
