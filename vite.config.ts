import tailwindcss from '@tailwindcss/vite';
import { sveltekit } from '@sveltejs/kit/vite';
import { defineConfig } from 'vite';
import { liveSockets } from './server/dev.ts';

export default defineConfig({
	plugins: [tailwindcss(), sveltekit(), liveSockets()],
	// Small fonts would become data: URLs, which the content security policy refuses.
	build: { assetsInlineLimit: 0 },
	worker: { format: 'es' },
	optimizeDeps: { include: ['mathjs', 'katex', 'yjs', 'y-websocket', 'y-indexeddb'] },
	server: { watch: { ignored: ['**/.data/**'] } }
});
