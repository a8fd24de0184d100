import tailwindcss from '@tailwindcss/vite';
import { sveltekit } from '@sveltejs/kit/vite';
import { defineConfig } from 'vite';

export default defineConfig({
	plugins: [tailwindcss(), sveltekit()],
	// Small fonts would become data: URLs, which the content security policy refuses.
	build: { assetsInlineLimit: 0 },
	worker: { format: 'es' },
	optimizeDeps: { include: ['mathjs', 'katex', 'yjs', 'y-websocket', 'y-indexeddb'] }
});
