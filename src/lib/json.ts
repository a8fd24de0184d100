/** What JSON makes of a value: moments become ISO texts. */
export type Json<T> = T extends Date
	? string
	: T extends object
		? { [K in keyof T]: Json<T[K]> }
		: T;

/** So that a page has the same shape from its load as from the API that refreshes it. */
export const toJson = <T>(value: T) => JSON.parse(JSON.stringify(value)) as Json<T>;
