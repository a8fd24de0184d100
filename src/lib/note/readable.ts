/** An item as plain text that a person can read and keep outside the note. */
import type { Item } from './items';
import { KIND_NAMES } from './items';
import type { Prose, ProseBlock, ProseInline } from './prose';

export function readableItem(item: Item, number: string): string {
	const lines = Object.entries(item).flatMap(([field, value]) => {
		if (field === 'id' || field === 'kind' || value === '') return [];
		if (field === 'body') return [readableProse(value as Prose)];
		if (Array.isArray(value)) return value.map((file) => `  file: ${file.name}`);
		return [`  ${field}: ${value}`];
	});
	return [`${number} ${KIND_NAMES[item.kind]}`, ...lines].join('\n');
}

/** The words of prose, a line for each block. */
export function readableProse(prose: Prose): string {
	return prose.content.map((block) => readableBlock(block, '')).join('\n');
}

function readableBlock(block: ProseBlock, indent: string): string {
	if (block.type === 'paragraph' || block.type === 'heading')
		return indent + (block.content ?? []).map(readableInline).join('');
	return block.content
		.flatMap((entry) => entry.content.map((inner) => readableBlock(inner, `${indent}- `)))
		.join('\n');
}

function readableInline(node: ProseInline): string {
	switch (node.type) {
		case 'text':
			return node.text;
		case 'hardBreak':
			return '\n';
		case 'formula':
			return node.attrs.tex;
		case 'quantity':
			return '…';
	}
}
