/** Captions of the columns, by what stands in the section. */
import type { ItemKind } from '$lib/note/items';

export type Captions = { source: string; value: string; beside: string; used: string };

const NONE: Captions = { source: '', value: '', beside: '', used: '' };

export function captionsFor(kinds: ReadonlySet<ItemKind>): Captions {
	const given = kinds.has('given');
	const calculated = kinds.has('calculation');
	if (given || calculated) {
		const source = given && calculated ? 'Source or formula' : given ? 'Source' : 'Formula';
		return { source, value: 'Value', beside: 'Std unc.', used: 'Used in' };
	}
	if (kinds.has('check')) {
		return { source: 'Must hold', value: 'Margin', beside: 'State', used: 'Needs' };
	}
	return NONE;
}

/** The kinds in each section, by the section's id; items above the first section count nowhere. */
export function kindsBySection(
	items: readonly { id: string; kind: ItemKind }[]
): Map<string, Set<ItemKind>> {
	const sections = new Map<string, Set<ItemKind>>();
	let within: Set<ItemKind> | undefined;
	for (const { id, kind } of items) {
		if (kind === 'section') sections.set(id, (within = new Set()));
		else within?.add(kind);
	}
	return sections;
}
