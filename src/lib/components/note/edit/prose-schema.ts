/** The editor's nodes and marks: those of `$lib/note/prose` and no others. */
import { Mark, Node, type Extensions } from '@tiptap/core';
import Subscript from '@tiptap/extension-subscript';
import Superscript from '@tiptap/extension-superscript';
import StarterKit from '@tiptap/starter-kit';
import { mount, unmount } from 'svelte';
import LiveValue from '../rows/LiveValue.svelte';
import { safeHref } from '../rows/links';
import type { SheetView } from '../sheet-view';
import { typeset } from '../tex';

const Link = Mark.create({
	name: 'link',
	inclusive: false,
	addAttributes: () => ({ href: { default: '' } }),
	// A pasted link that would run or fetch something else comes in as its words only.
	parseHTML: () => [
		{
			tag: 'a[href]',
			getAttrs: (element) => (safeHref(element.getAttribute('href') ?? '') ? null : false)
		}
	],
	renderHTML: ({ HTMLAttributes: { href } }) => [
		'a',
		{ class: 'way', ...(safeHref(String(href)) && { href }), rel: 'noopener noreferrer' },
		0
	]
});

const Formula = Node.create({
	name: 'formula',
	inline: true,
	group: 'inline',
	atom: true,
	addAttributes: () => ({ tex: { default: '' } }),
	parseHTML: () => [
		{
			tag: 'span[data-tex]',
			getAttrs: (element) => ({ tex: element.getAttribute('data-tex') ?? '' })
		}
	],
	renderHTML: ({ node }) => ['span', { 'data-tex': node.attrs.tex }],
	addNodeView:
		() =>
		({ node }) => {
			const dom = document.createElement('span');
			void typeset(String(node.attrs.tex)).then((formula) => dom.append(formula));
			return { dom };
		}
});

const quantity = (sheet: SheetView) =>
	Node.create({
		name: 'quantity',
		inline: true,
		group: 'inline',
		atom: true,
		addAttributes: () => ({ item: { default: '' }, output: { default: '' } }),
		parseHTML: () => [
			{
				tag: 'span[data-quantity]',
				getAttrs: (element) => ({
					item: element.getAttribute('data-quantity') ?? '',
					output: element.getAttribute('data-output') ?? ''
				})
			}
		],
		renderHTML: ({ node }) => [
			'span',
			{ 'data-quantity': node.attrs.item, 'data-output': node.attrs.output }
		],
		addNodeView:
			() =>
			({ node }) => {
				const dom = document.createElement('span');
				const { item, output } = node.attrs as { item: string; output: string };
				const value = mount(LiveValue, { target: dom, props: { item, output, sheet } });
				return { dom, ignoreMutation: () => true, destroy: () => void unmount(value) };
			}
	});

export const proseExtensions = (sheet: SheetView): Extensions => [
	StarterKit.configure({
		heading: { levels: [3, 4] },
		blockquote: false,
		code: false,
		codeBlock: false,
		dropcursor: false,
		gapcursor: false,
		horizontalRule: false,
		link: false,
		strike: false,
		// It would write an empty paragraph into the document of whoever only looks.
		trailingNode: false,
		underline: false,
		undoRedo: false
	}),
	Subscript,
	Superscript,
	Link,
	Formula,
	quantity(sheet)
];
