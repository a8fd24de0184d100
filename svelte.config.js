import adapter from '@sveltejs/adapter-node';
import { vitePreprocess } from '@sveltejs/vite-plugin-svelte';

/** @type {import('@sveltejs/kit').Config} */
export default {
	preprocess: vitePreprocess(),
	kit: {
		adapter: adapter(),
		alias: { $server: 'server' },
		// Vite tells by the address what the page has loaded already.
		paths: { relative: false },
		serviceWorker: { register: false },
		csp: {
			mode: 'nonce',
			directives: {
				'default-src': ['self'],
				'script-src': ['self'],
				'style-src': ['self'],
				// Widths and positions computed from data (the line, charts, KaTeX) are style attributes.
				'style-src-attr': ['unsafe-inline'],
				'img-src': ['self', 'blob:', 'data:'],
				'font-src': ['self'],
				'connect-src': ['self'],
				'worker-src': ['self'],
				'frame-ancestors': ['none'],
				'object-src': ['none'],
				'base-uri': ['none'],
				'form-action': ['self']
			}
		},
		typescript: {
			config: (config) => ({
				...config,
				include: [
					...config.include,
					'../server/**/*.ts',
					'../tests/**/*.ts',
					'../drizzle.config.ts',
					'../tailwind.config.ts',
					'../playwright.config.ts'
				]
			})
		}
	}
};
