/// <reference types="@sveltejs/kit" />
/// <reference lib="webworker" />
/**
 * Keeps the build's scripts and styles in the browser, so that editors which are loaded when somebody
 * first edits are there without a connection as well. Nothing that anybody wrote is kept here.
 */
import { build, version } from '$service-worker';

const scope = globalThis as unknown as ServiceWorkerGlobalScope;

const CACHE = `build-${version}`;
const kept = new Set(build.filter((path) => /\.(js|css)$/.test(path)));

scope.addEventListener('install', (event) => {
	event.waitUntil(
		caches
			.open(CACHE)
			.then((cache) => cache.addAll([...kept]))
			.then(() => scope.skipWaiting())
	);
});

scope.addEventListener('activate', (event) => {
	event.waitUntil(
		caches
			.keys()
			.then((names) =>
				Promise.all(names.filter((name) => name !== CACHE).map((name) => caches.delete(name)))
			)
			.then(() => scope.clients.claim())
	);
});

scope.addEventListener('fetch', (event) => {
	const { pathname, origin } = new URL(event.request.url);
	if (origin !== location.origin || !kept.has(pathname)) return;
	event.respondWith(
		caches.match(event.request, { cacheName: CACHE }).then((found) => found ?? fetch(event.request))
	);
});
