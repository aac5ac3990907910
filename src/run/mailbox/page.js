import { escape } from '../store/xml.js';

/** @typedef {import('./letters.js').Letter} Letter */

const style = `
	body { font: 1.1rem/1.5 system-ui, sans-serif; margin: 0 auto; max-width: 48rem; padding: 1rem; }
	li { border-bottom: 1px solid #8886; list-style: none; padding: 0.7rem 0; }
	ul { padding: 0; } small { opacity: 0.75; } pre { white-space: pre-wrap; overflow-wrap: anywhere; }
	:root { color-scheme: light dark; }`;

/** @param {string} title @param {string} body */
const page = (title, body) => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><title>${escape(title)}</title>
<meta name="viewport" content="width=device-width"><style>${style}</style></head>
<body>${body}</body></html>`;

/** @param {Letter[]} letters */
export function listPage(letters) {
	const lines = letters.map(
		(
			one
		) => `<li><a href="/letters/${encodeURIComponent(one.id)}">${escape(one.subject || 'No subject')}</a>
<br><small>to ${escape(one.to.join(', '))}, ${escape(one.date)}</small></li>`
	);
	const list = lines.length ? `<ul>${lines.join('')}</ul>` : '<p>No letters yet.</p>';
	return page(
		'Letters',
		`<h1>Letters</h1><p>What Endplay sent. Nothing left this machine.</p>${list}`
	);
}

/** @param {Letter} letter */
export function letterPage(letter) {
	const headers = letter.headers.map(({ name, value }) => `${name}: ${value}`).join('\n');
	return page(
		letter.subject,
		`<p><a href="/">All letters</a></p><h1>${escape(letter.subject)}</h1>
<p><small>from ${escape(letter.from)}<br>to ${escape(letter.to.join(', '))}<br>${escape(letter.date)}</small></p>
<pre>${linked(letter.text || letter.html)}</pre>
${letter.text && letter.html ? `<details><summary>HTML part</summary><pre>${escape(letter.html)}</pre></details>` : ''}
<details><summary>Headers</summary><pre>${escape(headers)}</pre></details>`
	);
}

/** @param {string} text */
function linked(text) {
	const pieces = text.split(/(https?:\/\/[^\s<>"')\]]*[^\s<>"')\].,;:!?])/);
	return pieces
		.map((piece, at) =>
			at % 2 ? `<a href="${escape(piece)}" rel="noreferrer">${escape(piece)}</a>` : escape(piece)
		)
		.join('');
}
