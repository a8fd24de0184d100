/** Typesetting near the window only: KaTeX is the dearest thing on a long sheet. */
import katex from 'katex';

const KEPT = 2000;
const kept = new Map<string, HTMLElement>();

/** The formula set, from what was set before where the same TeX comes again. */
export function typeset(tex: string): Node {
	let set = kept.get(tex);
	if (!set) {
		set = document.createElement('span');
		katex.render(tex, set, {
			output: 'html',
			throwOnError: false,
			trust: false,
			maxSize: 20,
			maxExpand: 200
		});
		if (kept.size >= KEPT) kept.delete(kept.keys().next().value!);
		kept.set(tex, set);
	}
	return set.cloneNode(true);
}

const waiting = new WeakMap<Element, () => void>();
let observer: IntersectionObserver | undefined;

/** Calls `near` once, when the element comes within a window's height of being seen. */
export function whenNear(element: Element, near: () => void): () => void {
	observer ??= new IntersectionObserver(
		(entries) => {
			for (const { isIntersecting, target } of entries) {
				if (!isIntersecting) continue;
				observer!.unobserve(target);
				waiting.get(target)?.();
				waiting.delete(target);
			}
		},
		{ rootMargin: '100% 0px' }
	);
	waiting.set(element, near);
	observer.observe(element);
	return () => observer!.unobserve(element);
}
