import { expect, test } from 'vitest';
import { splitIdentifiers } from './identifiers';

test('identification numbers are found in a sentence', () => {
	expect(splitIdentifiers('in CL-DN-003, 5.1, and CL-ST-01.')).toEqual([
		'in ',
		'CL-DN-003',
		', 5.1, and ',
		'CL-ST-01',
		'.'
	]);
	expect(splitIdentifiers('B-basis, n = 30')).toEqual(['B-basis, n = 30']);
});
