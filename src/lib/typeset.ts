/** How formulas are set, on the server and in the browser alike. */
import { createContext } from 'svelte';
import type { KatexOptions } from 'katex';

export const KATEX: KatexOptions = {
	output: 'html',
	throwOnError: false,
	trust: false,
	maxSize: 20,
	maxExpand: 200
};

/** HTML by TeX, of formulas that the server has set for a page that is only read. */
export type SetFormulas = Readonly<Record<string, string>>;

const [getGiven, provide, given] = createContext<() => SetFormulas>();

/** A page whose formulas come set needs no KaTeX in the browser. */
export const provideFormulas = provide;

/** The formulas that came with the page; none on a page that is written live. */
export const formulasGiven = (): (() => SetFormulas) => (given() ? getGiven() : () => ({}));
