import type { Page } from '@playwright/test';

export interface Control {
	said: string;
	x: number;
	y: number;
	width: number;
	height: number;
	/** A link in a sentence, which is as high as its line. */
	inline: boolean;
}

/** Where every control of the page stands and how large it is, as a finger meets it. */
export const controls = (page: Page): Promise<Control[]> =>
	page.evaluate(() => {
		const wanted = 'a[href], button, input:not([type=hidden]), select, textarea, summary';
		const seen = (element: Element) =>
			element.checkVisibility({ visibilityProperty: true }) &&
			!element.closest('.visually-hidden, .skip') &&
			element.getBoundingClientRect().width > 1;
		return [...document.querySelectorAll(wanted)].filter(seen).map((element) => {
			const { x, y, width, height } = element.getBoundingClientRect();
			const said =
				element.getAttribute('aria-label') ??
				(element.textContent?.trim().replace(/\s+/g, ' ') ||
					`${element.localName} ${element.id || element.getAttribute('name')}`);
			const inline = getComputedStyle(element).display === 'inline' && element.localName === 'a';
			return { said: said.slice(0, 60), x, y: y + scrollY, width, height, inline };
		});
	});

/** Pairs that stand closer to each other than `least` px. */
export function tooClose(all: Control[], least: number): string[] {
	const between = (a: Control, b: Control) => {
		const across = Math.max(a.x, b.x) - Math.min(a.x + a.width, b.x + b.width);
		const down = Math.max(a.y, b.y) - Math.min(a.y + a.height, b.y + b.height);
		return Math.max(across, down);
	};
	return all.flatMap((a, at) =>
		all
			.slice(at + 1)
			.filter((b) => between(a, b) < least - 0.51)
			.map((b) => `${a.said} | ${b.said}: ${between(a, b).toFixed(1)} px`)
	);
}

/** Opens what is folded and takes the dock off the page under it, so that everything stands in its own place. */
export const unfold = (page: Page): Promise<void> =>
	page.evaluate(() => {
		for (const details of document.querySelectorAll('details')) details.open = true;
		const dock = document.querySelector<HTMLElement>('.dock');
		if (dock) dock.style.position = 'static';
	});

/** What sticks out of the screen sideways or is cut off in its box. */
export const stickingOut = (page: Page): Promise<string[]> =>
	page.evaluate(() => {
		const name = (element: Element) =>
			`${element.localName}.${element.getAttribute('class') ?? ''} “${element.textContent?.trim().slice(0, 40)}”`;
		const root = document.documentElement;
		const wide = root.scrollWidth > root.clientWidth ? [`page is ${root.scrollWidth} px wide`] : [];
		const cut = [...document.querySelectorAll('body *')].filter((element) => {
			if (element.closest('.visually-hidden, .skip, svg, .picture, [hidden]')) return false;
			if (element.matches('input, textarea, select')) return false;
			const { overflowX } = getComputedStyle(element);
			const hides = overflowX === 'hidden' || overflowX === 'clip';
			return hides && element.scrollWidth > element.clientWidth + 1;
		});
		const out = [...document.querySelectorAll('body *')].filter((element) => {
			if (element.closest('.visually-hidden, .skip, svg, [hidden]')) return false;
			if (!element.checkVisibility()) return false;
			const box = element.getBoundingClientRect();
			return box.width > 0 && box.right > root.clientWidth + 1.5;
		});
		return [...wide, ...cut.map((one) => `cut: ${name(one)}`), ...out.slice(0, 3).map(name)];
	});

/** Tables without a caption or scoped heads, and names of fields that are there twice. */
export const structureFaults = (page: Page): Promise<string[]> =>
	page.evaluate(() => {
		const tables = [...document.querySelectorAll('table')].flatMap((table) => [
			...(table.caption?.textContent?.trim() ? [] : ['a table without a caption']),
			...[...table.querySelectorAll('th:not([scope])')].map((th) => `no scope: ${th.textContent}`)
		]);
		const ids = [...document.querySelectorAll('[id]')].map(({ id }) => id);
		const twice = ids.filter((id, at) => ids.indexOf(id) !== at);
		const spaced = ids.filter((id) => /\s/.test(id));
		const heads = document.querySelectorAll('h1').length;
		return [
			...tables,
			...twice.map((id) => `twice: #${id}`),
			...spaced.map((id) => `space in #${id}`),
			...(heads === 1 ? [] : [`${heads} first headings`])
		];
	});
