/** The one way in which a method says that there is no result: in words, never NaN and never Infinity. */

export type RefusalCode =
	/** An input is missing, of the wrong kind or out of its range. */
	| 'input'
	/** The inputs are sound one by one, but what they describe cannot be. */
	| 'refused'
	/** A figure above 1e300. */
	| 'beyond-any-build'
	/** The numerical method did not reach its tolerance. */
	| 'not-converged';

export type InputFault = {
	/** Where, e.g. "climbers.2.radius"; empty for the whole. */
	path: string;
	message: string;
};

export type Refusal = {
	code: RefusalCode;
	/** A sentence for the person: what cannot be, and why. */
	message: string;
	/** What to change; empty where that cannot be said. */
	remedy: string;
	/** The inputs it is about. */
	faults: InputFault[];
};

/** Thrown inside methods; `answer` turns it into a typed refusal, so that it reaches no caller. */
export class Refused extends Error {
	readonly code: RefusalCode;
	readonly remedy: string;
	readonly faults: InputFault[];

	constructor(
		message: string,
		more: { code?: RefusalCode; remedy?: string; faults?: InputFault[] } = {}
	) {
		super(message);
		this.code = more.code ?? 'refused';
		this.remedy = more.remedy ?? '';
		this.faults = more.faults ?? [];
	}

	get refusal(): Refusal {
		const { code, message, remedy, faults } = this;
		return { code, message, remedy, faults };
	}
}

/** A refusal about one input, by its path. */
export function refuseInput(path: string, message: string, remedy = ''): never {
	throw new Refused(message, { code: 'input', remedy, faults: [{ path, message }] });
}
