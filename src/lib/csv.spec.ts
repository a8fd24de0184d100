import { expect, test } from 'vitest';
import { csv, csvFile } from './csv';

test('fields are written as RFC 4180 §2 says', () => {
	expect(
		csv([
			['a', 1.5, null],
			['say "no"', 'x,y', 'two\nlines']
		])
	).toBe('\ufeffa,1.5,\r\n"say ""no""","x,y","two\nlines"\r\n');
});

test('a text that a spreadsheet would run as a formula is disarmed; a negative number is not', () => {
	expect(csv([['=HYPERLINK("x")', '+1', '@a', '-b', -2]])).toBe(
		'\ufeff"\'=HYPERLINK(""x"")",\'+1,\'@a,\'-b,-2\r\n'
	);
});

test('a file name cannot break out of its header', () => {
	const name = csvFile('CL-DN-004 "B"\r\nx.csv', []).headers.get('content-disposition');
	expect(name).toBe('attachment; filename="CL-DN-004_B_x.csv"');
});
