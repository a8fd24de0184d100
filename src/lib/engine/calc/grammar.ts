/**
 * mathjs's parser with plain nodes in place of its own: of what it knows only the grammar is wanted, and
 * neither its compiler, its types nor its functions, which would be most of what a page has to load.
 */
import { createParse } from 'mathjs/number';

declare module 'mathjs/number' {
	/** Makes the parser from its parts; mathjs's own types leave it out. */
	export function createParse(parts: Record<string, unknown>): (text: string) => Node;
}

/** The parts of a parsed node that are read. */
export type Node = {
	type: string;
	/** The operator's sign, by which the parser decides what multiplies without one. */
	op?: string;
	value?: unknown;
	name?: string;
	fn?: string | Node;
	args?: Node[];
	content?: Node;
	condition?: Node;
	trueExpr?: Node;
	falseExpr?: Node;
	conditionals?: string[];
	params?: Node[];
	items?: Node[];
	object?: Node;
	index?: Node;
	dimensions?: Node[];
};

/** A class of nodes that keep what they are made with under these names. */
function plain(type: string, ...fields: (keyof Node)[]) {
	const made = class {
		constructor(...given: unknown[]) {
			fields.forEach((field, i) => Object.assign(this, { [field]: given[i] }));
		}
	};
	// By these the parser tells its nodes apart.
	Object.assign(made.prototype, { type, isNode: true, [`is${type}`]: true });
	return made;
}

/** In place of mathjs's dispatch by type: of the ways to call the parser only that with a text is used. */
const byText = (_name: string, ways: { string: (text: string) => Node }) => ways.string;
byText.addConversion = () => {};

export const parseStructure = createParse({
	typed: byText,
	numeric: (text: string) => Number(text),
	config: { number: 'number', numberFallback: 'number' },
	AccessorNode: plain('AccessorNode', 'object', 'index'),
	ArrayNode: plain('ArrayNode', 'items'),
	AssignmentNode: plain('AssignmentNode'),
	BlockNode: plain('BlockNode'),
	ConditionalNode: plain('ConditionalNode', 'condition', 'trueExpr', 'falseExpr'),
	ConstantNode: plain('ConstantNode', 'value'),
	FunctionAssignmentNode: plain('FunctionAssignmentNode'),
	FunctionNode: plain('FunctionNode', 'fn', 'args'),
	IndexNode: plain('IndexNode', 'dimensions'),
	ObjectNode: plain('ObjectNode'),
	OperatorNode: plain('OperatorNode', 'op', 'fn', 'args'),
	ParenthesisNode: plain('ParenthesisNode', 'content'),
	RangeNode: plain('RangeNode'),
	RelationalNode: plain('RelationalNode', 'conditionals', 'params'),
	SymbolNode: plain('SymbolNode', 'name')
});
