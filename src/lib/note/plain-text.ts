import { LONGEST_TYPED } from './items';

/**
 * Text out of a document, fit for JSON, PostgreSQL and a digest: no NUL, which PostgreSQL refuses,
 * and no half of a surrogate pair, which UTF-8 cannot carry.
 */
export function plainText(text: string): string {
	return text.replaceAll('\0', '').replace(/\p{Surrogate}/gu, '\ufffd');
}

/** A typed field, cut at the longest text a field may have. */
export function typedText(text: string): string {
	return plainText(text.slice(0, LONGEST_TYPED));
}
