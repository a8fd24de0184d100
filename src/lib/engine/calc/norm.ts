/** Root of a sum of squares, none of which may leave the range of numbers. */
export class Norm {
	private scale = 0;
	private sum = 0;

	add(share: number): void {
		if (share === 0) return;
		const size = Math.abs(share);
		if (size > this.scale) {
			this.sum = 1 + this.sum * (this.scale / size) ** 2;
			this.scale = size;
		} else this.sum += (size / this.scale) ** 2;
	}

	get value(): number {
		return this.scale * Math.sqrt(this.sum);
	}
}
