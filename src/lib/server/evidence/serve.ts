/** A file of evidence as an HTTP answer (RFC 9110: ranges, entity tags). */
import { Problem } from '../problems';
import type { StoredFile } from './evidence';
import { shownInPlace } from './media-type';
import { byteRange } from './range';
import { getObject } from './store';

export async function serveEvidence(file: StoredFile, request: Request): Promise<Response> {
	const etag = `"${file.sha256}"`;
	const headers = new Headers({
		etag,
		'accept-ranges': 'bytes',
		// Kept by the browser, shown again only after we were asked: rights may have been taken away.
		'cache-control': 'private, no-cache',
		'content-type': file.mediaType,
		'content-disposition': disposition(file),
		// Attack stopped here: a file that a browser would run as a page of this site.
		'x-content-type-options': 'nosniff',
		'content-security-policy': "default-src 'none'; sandbox",
		'cross-origin-resource-policy': 'same-origin'
	});
	if (request.headers.get('if-none-match') === etag)
		return new Response(null, { status: 304, headers });

	const ifRange = request.headers.get('if-range');
	const asked = ifRange === null || ifRange === etag ? request.headers.get('range') : null;
	const range = byteRange(asked, file.size);
	if (range === 'beyond') {
		headers.set('content-range', `bytes */${file.size}`);
		return new Response(null, { status: 416, headers });
	}
	const { first, last } = range ?? { first: 0, last: file.size - 1 };
	headers.set('content-length', String(last - first + 1));
	if (range) headers.set('content-range', `bytes ${first}-${last}/${file.size}`);

	const body = await getObject(file.objectKey, { first, last });
	if (!body) throw new Problem(503, `${file.name} is not in the store; tell your administrator.`);
	return new Response(body, { status: range ? 206 : 200, headers });
}

/** RFC 6266: a plain form for old readers, and the whole name percent-encoded. */
function disposition({ name, mediaType }: StoredFile): string {
	const plain = name.replace(/[^\x20-\x7e]|["\\%]/g, '_');
	const whole = encodeURIComponent(name).replace(
		/['()*]/g,
		(sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`
	);
	const manner = shownInPlace(mediaType) ? 'inline' : 'attachment';
	return `${manner}; filename="${plain}"; filename*=UTF-8''${whole}`;
}
