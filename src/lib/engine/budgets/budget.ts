/**
 * A budget of masses (powers, costs): each item's basic figure with a growth allowance by the maturity of its
 * design, and on the sum of the predicted figures a system margin, held against an allocation.
 * predicted = basic (1 + growth); reserved = predicted (1 + system margin); remaining = allocation − reserved.
 * The allowances by maturity are the user's own; those of AIAA S-120A and the agencies' 5, 10 and 20 % are
 * common practice.
 */

export type BudgetItem = {
	basic: number;
	/** Growth allowance as a fraction. */
	growth: number;
	allocation?: number | undefined;
};

export type BudgetLine = {
	growth: number;
	/** basic × growth */
	allowance: number;
	predicted: number;
	/** Of the item's own allocation, where it has one: allocation − predicted. */
	remaining?: number;
};

export type Budget = {
	lines: BudgetLine[];
	basic: number;
	allowance: number;
	predicted: number;
	systemMargin: number;
	/** Predicted and system margin together. */
	reserved: number;
	/** allocation − reserved; negative where the budget is overdrawn. */
	remaining?: number;
};

/** All figures in one SI unit; `systemMargin` is a fraction of the predicted total. */
export function budgetOf(
	items: readonly BudgetItem[],
	systemMargin: number,
	allocation?: number
): Budget {
	const lines = items.map(({ basic, growth, allocation: own }): BudgetLine => {
		const predicted = basic * (1 + growth);
		return {
			growth,
			allowance: basic * growth,
			predicted,
			...(own !== undefined && { remaining: own - predicted })
		};
	});
	const total = (figures: number[]) => figures.reduce((sum, each) => sum + each, 0);
	const predicted = total(lines.map((line) => line.predicted));
	const reserved = predicted * (1 + systemMargin);
	return {
		lines,
		basic: total(items.map((item) => item.basic)),
		allowance: total(lines.map((line) => line.allowance)),
		predicted,
		systemMargin: predicted * systemMargin,
		reserved,
		...(allocation !== undefined && { remaining: allocation - reserved })
	};
}
