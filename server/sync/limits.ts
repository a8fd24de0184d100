/** What one connection, one person and one note may ask of the server. */
export type Limits = {
	/** Largest frame in bytes; a pasted note or a day's work offline fits. */
	frame: number;
	/** Requests to upgrade from one address that are being decided at once. */
	undecidedPerAddress: number;
	/** Sockets of one person. */
	socketsPerPerson: number;
	/** Messages a second that a connection may send for long; each 4 kB count as one more. */
	rate: number;
	/** Messages at once before the rate holds. */
	burst: number;
	/** Bytes waiting to be sent to one slow client before it is cut off; it can come back. */
	outgoing: number;
	/** Bytes of edits of one note waiting for the database before further ones are turned away. */
	uncommitted: number;
	/** Between two pings, in milliseconds; who does not answer one is gone. */
	ping: number;
};

export const LIMITS: Limits = {
	frame: 8 * 1024 * 1024,
	undecidedPerAddress: 50,
	socketsPerPerson: 24,
	rate: 200,
	burst: 2000,
	outgoing: 32 * 1024 * 1024,
	uncommitted: 32 * 1024 * 1024,
	ping: 20_000
};

/** A token bucket: what may be spent comes back at a rate, up to a burst. */
export class Allowance {
	#left: number;
	#at = Date.now();

	constructor(
		private readonly rate: number,
		private readonly burst: number
	) {
		this.#left = burst;
	}

	/** Spends; the answer is how long to wait until it is paid for, in milliseconds. */
	spend(cost: number): number {
		const now = Date.now();
		this.#left = Math.min(this.burst, this.#left + ((now - this.#at) / 1000) * this.rate) - cost;
		this.#at = now;
		return this.#left >= 0 ? 0 : (-this.#left / this.rate) * 1000;
	}
}
