import type { LengthUnit } from '../../units';
import { apart, type Point } from './geometry';
import { LEAST_APART, readLength, sayReading, usualSizes, type Reading } from './ruler';
import { Stage } from './stage.svelte';
import type { PinnedPhoto, PinView } from './view';

export type Doing = 'pins' | 'ruler' | 'measure';

/** What somebody does on a photo: pins with the crosshair, or two points of a length. */
export class Board {
	readonly stage: Stage;
	doing = $state<Doing>('pins');
	/** The pin that was chosen, in the picture or in the list. */
	chosen = $state<number | null>(null);
	/** The pin that a finger, the mouse or the focus rests on. */
	touched = $state<number | null>(null);
	/** The pin whose place is being set anew. */
	moving = $state.raw<PinView | null>(null);
	/** The ends of the length that is being set or measured. */
	ends = $state.raw<readonly Point[]>([]);

	constructor(
		private readonly photo: () => PinnedPhoto,
		private readonly units: () => LengthUnit,
		private readonly mayWork: () => boolean,
		/** The crosshair was taken by Enter: on to what it means. */
		private readonly onTaken: () => void
	) {
		this.stage = new Stage(() => this.tall, this.#tapped);
	}

	get tall(): number {
		const { width, height } = this.photo();
		return height / width;
	}

	get lit(): number | null {
		return this.touched ?? this.chosen;
	}

	/** The length between the ends, once the photo has a ruler. */
	get reading(): Reading | null {
		const { ruler } = this.photo();
		const [a, b] = this.ends;
		if (!ruler || !a || !b || apart(a, b, this.tall) < LEAST_APART) return null;
		const from = { x: ruler.x1, y: ruler.y1 };
		const to = { x: ruler.x2, y: ruler.y2 };
		return readLength({ from, to, mm: ruler.mm }, a, b, this.tall);
	}

	get read(): string {
		return this.doing === 'measure' && this.reading ? sayReading(this.reading, this.units()) : '';
	}

	get usual() {
		return this.reading ? usualSizes(this.reading, this.units()) : [];
	}

	turnTo(doing: Doing): void {
		this.doing = doing;
		this.drop();
	}

	/** Lets go of whatever is being set. */
	drop = () => {
		this.stage.cross = null;
		this.moving = null;
		this.ends = [];
	};

	choose(id: number): void {
		this.chosen = this.chosen === id ? null : id;
	}

	move(pin: PinView): void {
		this.doing = 'pins';
		this.moving = pin;
		this.stage.cross = { x: pin.x, y: pin.y };
		this.stage.show(pin);
	}

	#tapped = (at: Point, by: 'tap' | 'key') => {
		if (!this.mayWork()) return;
		if (this.doing === 'pins') {
			this.stage.cross = at;
			if (!this.moving) this.chosen = null;
			if (by === 'key') this.onTaken();
			return;
		}
		this.ends = this.#withEnd(at);
		if (by === 'key' && this.ends.length === 2) this.onTaken();
	};

	/** A third point takes the place of the nearer end. */
	#withEnd(at: Point): readonly Point[] {
		const [a, b] = this.ends;
		if (!a || !b) return [...this.ends, at];
		return apart(a, at, this.tall) < apart(b, at, this.tall) ? [at, b] : [a, at];
	}
}
