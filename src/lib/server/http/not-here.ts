const HTML = `<!doctype html>
<html lang="en">
	<head>
		<meta charset="utf-8" />
		<meta name="viewport" content="width=device-width, initial-scale=1" />
		<meta name="color-scheme" content="light dark" />
		<title>Not here · Endplay</title>
		<style>
			body { max-width: 34rem; margin: 12vh auto; padding: 0 1.2rem; font: 1.15rem/1.5 system-ui, sans-serif; }
			a { color: inherit; }
		</style>
	</head>
	<body>
		<h1>Nothing here</h1>
		<p>This is not here, or not yours to see. Look at the address, or go back.</p>
		<p><a href="/choose-shop">Back to the shop</a></p>
	</body>
</html>
`;

/** The same bytes for another shop as for none, so that nobody learns which shops there are. */
export const notHere = () =>
	new Response(HTML, { status: 404, headers: { 'content-type': 'text/html; charset=utf-8' } });
