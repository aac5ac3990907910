import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { createServer } from 'vite';
import { root } from './files.js';

/** Writes api/openapi.json from the inputs that the server itself reads by. */
const vite = await createServer({
	root,
	configFile: join(root, 'vite.config.ts'),
	server: { middlewareMode: true, hmr: false, ws: false, watch: null },
	appType: 'custom',
	logLevel: 'error',
	optimizeDeps: { noDiscovery: true, include: [] }
});
try {
	const { openApi } = await vite.ssrLoadModule('/src/routes/api/openapi.json/document.ts');
	mkdirSync(join(root, 'api'), { recursive: true });
	writeFileSync(join(root, 'api/openapi.json'), `${JSON.stringify(openApi(), null, '\t')}\n`);
	console.log('api/openapi.json is written.');
} finally {
	await vite.close();
}
process.exit(0);
