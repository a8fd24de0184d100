import { openApi } from '$lib/server/engine/openapi';

/** One text for as long as the process lives: anybody may ask, also without a token. */
let written: string | undefined;

export function GET() {
	written ??= JSON.stringify(openApi());
	return new Response(written, { headers: { 'content-type': 'application/json' } });
}
