/** What one item sees of the others while it is evaluated. */
import type { Slot } from './slot';

export type Scope = {
	/** What stands behind a name; "model" is a line model as a whole, which is no quantity. */
	supply(name: string): Slot | 'unknown' | 'model';
	/** Whether the note defines the name. */
	defines(name: string): boolean;
	/** Names like this one, best first. */
	near(name: string): string[];
};
