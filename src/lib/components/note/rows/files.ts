/** Evidence files as rows show them. */
const PICTURES = ['image/png', 'image/jpeg', 'image/webp', 'image/gif', 'image/avif'];

export const fileHref = (fileId: string) => `/api/evidence/${encodeURIComponent(fileId)}`;

export const isPicture = (mediaType: string) => PICTURES.includes(mediaType);

/** Size in decimal units, as files are sold and sent: 1 kB is 1000 bytes. */
export function sizeWords(bytes: number): string {
	const units = ['B', 'kB', 'MB', 'GB'];
	let size = bytes;
	let step = 0;
	while (size >= 999.5 && step < units.length - 1) {
		size /= 1000;
		step += 1;
	}
	const shown = step === 0 || size >= 99.5 ? size.toFixed(0) : size.toFixed(1);
	return `${shown}\u202f${units[step]}`;
}
