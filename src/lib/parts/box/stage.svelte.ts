import {
	onPicture,
	pan,
	pinch,
	showing,
	toPicture,
	WHOLE,
	zoomAt,
	type Point,
	type View
} from './geometry';

/** Farther than this a finger is not tapping any more, in dots of the screen. */
const TAP = 8;
const STEP = 1.5;
const CENTRE: Point = { x: 0.5, y: 0.5 };
const ARROWS: Record<string, Point> = {
	ArrowLeft: { x: -1, y: 0 },
	ArrowRight: { x: 1, y: 0 },
	ArrowUp: { x: 0, y: -1 },
	ArrowDown: { x: 0, y: 1 }
};

/** A picture on its stage under fingers, mouse and keys: how it lies, and where its crosshair is. */
export class Stage {
	view = $state.raw<View>(WHOLE);
	/** Where something is to be set, on the picture; null while nothing is. */
	cross = $state.raw<Point | null>(null);

	#fingers: { id: number; at: Point }[] = [];
	#down: Point = { x: 0, y: 0 };
	#dragged = false;

	constructor(
		private readonly tall: () => number,
		/** Somebody tapped the picture, or took the place of the crosshair by Enter. */
		private readonly onTap: (at: Point, by: 'tap' | 'key') => void
	) {}

	zoom(factor: number, at: Point = CENTRE): void {
		this.view = zoomAt(this.view, at, factor);
	}
	closer = () => this.zoom(STEP);
	farther = () => this.zoom(1 / STEP);
	whole = () => (this.view = WHOLE);
	/** Brings a point of the picture into sight. */
	show = (at: Point) => (this.view = showing(this.view, at));

	/** Where an event happened on the stage. */
	#at({ clientX, clientY }: MouseEvent, stage: Element): Point {
		const { left, top, width, height } = stage.getBoundingClientRect();
		return { x: (clientX - left) / width, y: (clientY - top) / height };
	}

	down = (event: PointerEvent & { currentTarget: Element }) => {
		if (event.button !== 0) return;
		if (this.#fingers.length === 0) {
			this.#down = { x: event.clientX, y: event.clientY };
			this.#dragged = false;
		}
		this.#fingers.push({ id: event.pointerId, at: this.#at(event, event.currentTarget) });
		if (this.#fingers.length > 1) this.#dragged = true;
	};

	move = (event: PointerEvent & { currentTarget: Element }) => {
		const finger = this.#fingers.find(({ id }) => id === event.pointerId);
		if (!finger) return;
		const far = Math.hypot(event.clientX - this.#down.x, event.clientY - this.#down.y) > TAP;
		if (!this.#dragged && !far) return;
		if (!this.#dragged) event.currentTarget.setPointerCapture(event.pointerId);
		this.#dragged = true;
		const now = this.#at(event, event.currentTarget);
		const other = this.#fingers.find((one) => one !== finger);
		this.view = other
			? pinch(this.view, [finger.at, other.at], [now, other.at], this.tall())
			: pan(this.view, { x: now.x - finger.at.x, y: now.y - finger.at.y });
		finger.at = now;
	};

	up = (event: PointerEvent) => {
		this.#fingers = this.#fingers.filter(({ id }) => id !== event.pointerId);
	};

	click = (event: MouseEvent & { currentTarget: Element }) => {
		if (this.#dragged || (event.target as Element).closest('a')) return;
		const at = toPicture(this.view, this.#at(event, event.currentTarget));
		this.onTap(onPicture(at), 'tap');
	};

	/** After a drag nothing was clicked, whatever lay under the finger. */
	noClick = (event: MouseEvent) => {
		// a key that clicks has no clicks to its count
		if (!this.#dragged || event.detail === 0) return;
		event.preventDefault();
		event.stopPropagation();
		this.#dragged = false;
	};

	wheel = (event: WheelEvent & { currentTarget: Element }) => {
		if (event.deltaY > 0 && this.view.zoom === 1) return;
		event.preventDefault();
		const factor = Math.exp(-event.deltaY * (event.ctrlKey ? 0.01 : 0.002));
		this.zoom(factor, this.#at(event, event.currentTarget));
	};

	/** Listens where the browser would scroll otherwise, which only an active listener can stop. */
	active = (node: HTMLElement) => {
		const wheel = (event: WheelEvent) =>
			this.wheel(event as WheelEvent & { currentTarget: Element });
		const touch = (event: TouchEvent) => {
			if (event.touches.length > 1 || this.view.zoom > 1) event.preventDefault();
		};
		node.addEventListener('wheel', wheel, { passive: false });
		node.addEventListener('touchmove', touch, { passive: false });
		node.addEventListener('click', this.noClick, { capture: true });
		return () => {
			node.removeEventListener('wheel', wheel);
			node.removeEventListener('touchmove', touch);
			node.removeEventListener('click', this.noClick, { capture: true });
		};
	};

	key = (event: KeyboardEvent) => {
		if (event.ctrlKey || event.metaKey || event.altKey) return;
		if (!this.#pressed(event)) return;
		event.preventDefault();
	};

	#pressed({ key, shiftKey, target, currentTarget }: KeyboardEvent): boolean {
		const arrow = ARROWS[key];
		if (arrow) this.#push(arrow, shiftKey);
		else if (key === '+' || key === '=') this.closer();
		else if (key === '-' || key === '_') this.farther();
		else if (key === '0') this.whole();
		else if (key === 'Escape' && this.cross) this.cross = null;
		else if (key === 'Enter' && target === currentTarget) this.#enter();
		else return false;
		return true;
	}

	#push({ x, y }: Point, fine: boolean): void {
		if (!this.cross) {
			this.view = pan(this.view, { x: -x * 0.15, y: -y * 0.15 });
			return;
		}
		const far = (fine ? 0.004 : 0.02) / this.view.zoom;
		this.cross = onPicture({ x: this.cross.x + x * far, y: this.cross.y + y * far });
		this.show(this.cross);
	}

	#enter(): void {
		if (this.cross) this.onTap(this.cross, 'key');
		else this.cross = onPicture(toPicture(this.view, CENTRE));
	}
}
