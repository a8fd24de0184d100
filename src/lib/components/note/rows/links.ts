/** Links in prose lead to web pages, mail and places of this site; no other protocol is followed. */
const ALLOWED = /^(https?:\/\/|mailto:|\/(?![/\\])|#)/i;

export function safeHref(href: string): boolean {
	return ALLOWED.test(href);
}
