/** What kind of file the bytes are; the name is believed only where bytes cannot tell. */
import { fileTypeFromBuffer } from 'file-type';
import { Problem } from '../problems';

/** As many first bytes as the recognition of kinds looks at. */
export const HEAD = 4100;
export const UNKNOWN = 'application/octet-stream';

/** Programs for some machine. Attack stopped here: evidence that runs when a colleague opens it. */
const PROGRAM_TYPES = new Set([
	'application/java-archive',
	'application/java-vm',
	'application/vnd.android.package-archive',
	'application/vnd.ms-htmlhelp',
	'application/x-apple-diskimage',
	'application/x-deb',
	'application/x-elf',
	'application/x-mach-binary',
	'application/x-msdownload',
	'application/x-rpm',
	'application/x.ms.shortcut'
]);
const PROGRAM_NAMES =
	/\.(appx|bat|cmd|com|cpl|dll|exe|hta|jar|js|jse|lnk|msi|ps1|reg|scr|vbe|vbs|wsf)$/i;

/** Kinds of text, by the end of the name; they hold when the whole file is UTF-8. */
const TEXT_TYPES: Record<string, string> = {
	csv: 'text/csv',
	htm: 'text/html',
	html: 'text/html',
	json: 'application/json',
	md: 'text/markdown',
	svg: 'image/svg+xml',
	tsv: 'text/tab-separated-values',
	txt: 'text/plain',
	xml: 'application/xml'
};

/** Pictures that a browser shows in place. SVG is not among them: it carries scripts. */
const INLINE = new Set(['image/avif', 'image/gif', 'image/jpeg', 'image/png', 'image/webp']);

export const shownInPlace = (mediaType: string) => INLINE.has(mediaType);

export type Kind = { mediaType: string; mustBeText: boolean };

/** @throws Problem for a program. */
export async function recogniseKind(head: Uint8Array, name: string): Promise<Kind> {
	const seen = (await fileTypeFromBuffer(head))?.mime;
	if (PROGRAM_NAMES.test(name) || (seen && PROGRAM_TYPES.has(seen)))
		throw new Problem(415, `${name} is a program; programs are not taken as evidence.`);
	// XML may be one of several kinds of text.
	if (seen && seen !== 'application/xml') return { mediaType: seen, mustBeText: false };
	const textType = TEXT_TYPES[name.split('.').at(-1)!.toLowerCase()];
	return textType
		? { mediaType: textType, mustBeText: true }
		: { mediaType: UNKNOWN, mustBeText: false };
}
