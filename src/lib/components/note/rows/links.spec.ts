import { expect, test } from 'vitest';
import { safeHref } from './links';

test('a link leads to the web, to mail, or to a place of this site', () => {
	for (const href of [
		'https://a.example/x',
		'http://a.example',
		'mailto:a@b.example',
		'/programmes',
		'#4.2'
	])
		expect(safeHref(href), href).toBe(true);
});

test('a link that would run or fetch something else is not followed', () => {
	for (const href of [
		'javascript:alert(1)',
		' javascript:alert(1)',
		'data:text/html,x',
		'//evil.example',
		'/\\evil.example',
		'file:///etc/passwd',
		'vbscript:x'
	])
		expect(safeHref(href), href).toBe(false);
});
