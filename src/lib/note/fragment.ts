/** Prose between its plain shape and the Y.XmlFragment that editors share (y-prosemirror's layout). */
import * as Y from 'yjs';
import { proseSchema, type Prose, type ProseMark } from './prose';

type Node = {
	type: string;
	text?: string;
	attrs?: Record<string, unknown>;
	marks?: ProseMark[];
	content?: Node[];
};

/** A fragment holding the prose, to be put into a document. */
export function proseToFragment(prose: Prose): Y.XmlFragment {
	const fragment = new Y.XmlFragment();
	fragment.insert(0, (prose.content as Node[]).map(toElement));
	return fragment;
}

function toElement(node: Node): Y.XmlElement {
	const element = new Y.XmlElement(node.type);
	for (const [name, value] of Object.entries(node.attrs ?? {}))
		element.setAttribute(name, value as string);
	const children: (Y.XmlElement | Y.XmlText)[] = [];
	let run: Node[] = [];
	const flush = () => {
		if (run.length === 0) return;
		const text = new Y.XmlText();
		text.applyDelta(
			run.map((part) => ({
				insert: part.text ?? '',
				attributes: Object.fromEntries(
					(part.marks ?? []).map((mark) => [mark.type, 'attrs' in mark ? mark.attrs : {}])
				)
			}))
		);
		children.push(text);
		run = [];
	};
	for (const child of node.content ?? []) {
		if (child.type === 'text') run.push(child);
		else {
			flush();
			children.push(toElement(child));
		}
	}
	flush();
	element.insert(0, children);
	return element;
}

const MARKS = ['bold', 'italic', 'subscript', 'superscript', 'link'];

/** The prose in a fragment. What is not of the closed shape is left out, never thrown on. */
export function fragmentToProse(fragment: Y.XmlFragment): Prose {
	const content = fragment.toArray().flatMap(fromNode);
	const whole = proseSchema.safeParse({ type: 'doc', content });
	if (whole.success) return whole.data;
	const sound = content.filter(
		(block) => proseSchema.safeParse({ type: 'doc', content: [block] }).success
	);
	return { type: 'doc', content: sound as Prose['content'] };
}

function fromNode(node: Y.XmlElement | Y.XmlText | Y.XmlHook): Node[] {
	if (node instanceof Y.XmlText) {
		return (node.toDelta() as { insert: unknown; attributes?: Record<string, unknown> }[]).flatMap(
			({ insert, attributes }) => {
				if (typeof insert !== 'string' || insert === '') return [];
				const marks = Object.entries(attributes ?? {})
					.filter(([name, value]) => MARKS.includes(name) && value)
					.map(([type, attrs]) => (type === 'link' ? { type, attrs } : { type }) as ProseMark)
					.sort((a, b) => MARKS.indexOf(a.type) - MARKS.indexOf(b.type));
				return [{ type: 'text', text: insert, ...(marks.length > 0 && { marks }) }];
			}
		);
	}
	if (!(node instanceof Y.XmlElement)) return [];
	const attrs = node.getAttributes() as Record<string, unknown>;
	const content = node.toArray().flatMap((child) => fromNode(child as Y.XmlElement | Y.XmlText));
	const leaf = ['formula', 'quantity', 'hardBreak'].includes(node.nodeName);
	return [
		{
			type: node.nodeName,
			...(Object.keys(attrs).length > 0 && { attrs }),
			...(!leaf && { content })
		}
	];
}
