import type { Fault, FaultCode } from './results';

/** A stretch of one text, before it is known which field the text is. */
export type Place = { from: number; to: number };

/** Thrown inside the engine where a text has no value; it never leaves the sheet. */
export class Refusal extends Error {
	constructor(
		public code: FaultCode,
		message: string,
		public more: { remedy?: string; place?: Place | null; near?: string[] } = {}
	) {
		super(message);
	}

	in(field: string): Fault {
		const { remedy = '', place = null, near = [] } = this.more;
		return fault(this.code, this.message, {
			remedy,
			near,
			span: place && { field, from: place.from, to: place.to }
		});
	}
}

export function fault(
	code: FaultCode,
	message: string,
	more: Partial<Omit<Fault, 'code' | 'message'>> = {}
): Fault {
	return { code, message, remedy: '', span: null, near: [], items: [], ...more };
}
