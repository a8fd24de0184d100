/** Prose from its plain shape into the Y.XmlFragment that editors share (y-prosemirror's layout), and back. */
import * as Y from 'yjs';
import { plainText } from './plain-text';
import {
	DEEPEST_LIST,
	inlineSchema,
	markSchema,
	type Prose,
	type ProseBlock,
	type ProseInline,
	type ProseListItem,
	type ProseMark
} from './prose';

type Node = ProseBlock | ProseListItem | ProseInline;
type TextNode = Extract<ProseInline, { type: 'text' }>;

/** A fragment holding the prose, to be put into a document. */
export function proseToFragment(prose: Prose): Y.XmlFragment {
	const fragment = new Y.XmlFragment();
	fragment.insert(0, prose.content.map(toElement));
	return fragment;
}

function toElement(node: Exclude<Node, TextNode>): Y.XmlElement {
	const element = new Y.XmlElement(node.type);
	if ('attrs' in node)
		for (const [name, value] of Object.entries(node.attrs))
			element.setAttribute(name, value as string);
	const children: (Y.XmlElement | Y.XmlText)[] = [];
	let run: TextNode[] = [];
	const endRun = () => {
		if (run.length > 0) children.push(toText(run));
		run = [];
	};
	for (const child of ('content' in node ? node.content : undefined) ?? []) {
		if (child.type === 'text') run.push(child);
		else {
			endRun();
			children.push(toElement(child));
		}
	}
	endRun();
	element.insert(0, children);
	return element;
}

function toText(run: TextNode[]): Y.XmlText {
	const text = new Y.XmlText();
	text.applyDelta(
		run.map((part) => ({
			insert: part.text,
			attributes: Object.fromEntries(
				(part.marks ?? []).map((mark) => [mark.type, 'attrs' in mark ? mark.attrs : {}])
			)
		}))
	);
	return text;
}

/** The prose in a fragment. What is not of the closed shape is left out, never thrown on. */
export function fragmentToProse(fragment: Y.XmlFragment): Prose {
	return { type: 'doc', content: blocks(fragment, 0) };
}

type Parent = Y.XmlFragment | Y.XmlElement;

const elements = (parent: Parent) =>
	parent.toArray().filter((child): child is Y.XmlElement => child instanceof Y.XmlElement);

function blocks(parent: Parent, depth: number): ProseBlock[] {
	return elements(parent).flatMap((element): ProseBlock[] => {
		switch (element.nodeName) {
			case 'paragraph':
				return [{ type: 'paragraph', content: inlines(element) }];
			case 'heading': {
				const level = (element.getAttribute('level') as unknown) === 4 ? 4 : 3;
				return [{ type: 'heading', attrs: { level }, content: inlines(element) }];
			}
			case 'bulletList':
			case 'orderedList':
				if (depth === DEEPEST_LIST) return [];
				return [{ type: element.nodeName, content: listItems(element, depth + 1) }];
			default:
				return [];
		}
	});
}

function listItems(list: Y.XmlElement, depth: number): ProseListItem[] {
	return elements(list)
		.filter((element) => element.nodeName === 'listItem')
		.map((element) => ({ type: 'listItem', content: blocks(element, depth) }));
}

function inlines(parent: Y.XmlElement): ProseInline[] {
	return parent.toArray().flatMap((child): ProseInline[] => {
		if (child instanceof Y.XmlText) return texts(child);
		if (!(child instanceof Y.XmlElement)) return [];
		const parsed = inlineSchema.safeParse({ type: child.nodeName, attrs: child.getAttributes() });
		return parsed.success ? [parsed.data] : [];
	});
}

function texts(text: Y.XmlText): TextNode[] {
	const delta = text.toDelta() as { insert: unknown; attributes?: Record<string, unknown> }[];
	return delta.flatMap(({ insert, attributes }): TextNode[] => {
		const plain = typeof insert === 'string' ? plainText(insert) : '';
		if (plain === '') return [];
		const marks = readMarks(attributes ?? {});
		return [{ type: 'text', text: plain, ...(marks.length > 0 && { marks }) }];
	});
}

/** In one order, so that the same formatting always reads the same. */
const MARK_ORDER = ['bold', 'italic', 'subscript', 'superscript', 'link'];

function readMarks(attributes: Record<string, unknown>): ProseMark[] {
	return MARK_ORDER.flatMap((type) => {
		if (!Object.hasOwn(attributes, type) || !attributes[type]) return [];
		const parsed = markSchema.safeParse({ type, attrs: attributes[type] });
		return parsed.success ? [parsed.data] : [];
	});
}
