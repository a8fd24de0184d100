/** Numbers in sentences. */
const WORDS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten'];

/** "four tries", "one try"; figures above ten. */
export function counted(count: number, one: string, many = `${one}s`): string {
	return `${WORDS[count] ?? count} ${count === 1 ? one : many}`;
}

export const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
