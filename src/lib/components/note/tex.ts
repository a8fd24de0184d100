/** Typesetting near the window only: KaTeX is the dearest thing on a long sheet. */
import { KATEX } from '$lib/typeset';

const KEPT = 2000;
const kept = new Map<string, HTMLElement>();

/** The formula set, from what was set before where the same TeX comes again. */
export async function typeset(tex: string): Promise<Node> {
	let set = kept.get(tex);
	if (!set) {
		const { default: katex } = await import('katex');
		set = document.createElement('span');
		katex.render(tex, set, KATEX);
		if (kept.size >= KEPT) kept.delete(kept.keys().next().value!);
		kept.set(tex, set);
	}
	return set.cloneNode(true);
}

const waiting = new Map<Element, () => void>();
let observer: IntersectionObserver | undefined;

/** Calls `near` once, when the element comes within a window's height of being seen. */
export function whenNear(element: Element, near: () => void): () => void {
	observer ??= watchWindow();
	waiting.set(element, near);
	observer.observe(element);
	return () => {
		observer!.unobserve(element);
		waiting.delete(element);
	};
}

function watchWindow(): IntersectionObserver {
	const set = (element: Element) => {
		made.unobserve(element);
		waiting.get(element)?.();
		waiting.delete(element);
	};
	// On paper everything is near.
	addEventListener('beforeprint', () => [...waiting.keys()].forEach(set));
	const made = new IntersectionObserver(
		(entries) => {
			for (const { isIntersecting, target } of entries) if (isIntersecting) set(target);
		},
		{ rootMargin: '100% 0px' }
	);
	return made;
}
