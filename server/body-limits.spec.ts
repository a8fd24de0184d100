import type { IncomingMessage } from 'node:http';
import { expect, test } from 'vitest';
import { bodyRefusal } from './body-limits';

const MB = 1024 * 1024;

function refused(method: string, url: string, headers: IncomingMessage['headers']): boolean {
	return bodyRefusal({ method, url, headers } as IncomingMessage, 100) !== null;
}

test('a form of ordinary size passes', () => {
	expect(refused('POST', '/sign-in', { 'content-length': '300' })).toBe(false);
	expect(refused('GET', '/', {})).toBe(false);
});

test('a form of more than 512 kB is refused', () => {
	expect(refused('POST', '/sign-in', { 'content-length': `${MB}` })).toBe(true);
});

test('a body of unknown length is refused outside the upload of evidence', () => {
	expect(refused('POST', '/sign-in', { 'transfer-encoding': 'chunked' })).toBe(true);
	expect(refused('POST', '/api/notes/1/evidence?name=a', { 'transfer-encoding': 'chunked' })).toBe(
		false
	);
});

test('evidence of 100 MB passes and one byte more does not', () => {
	const url = '/api/notes/1/evidence?name=a.png';
	expect(refused('POST', url, { 'content-length': `${100 * MB}` })).toBe(false);
	expect(refused('POST', url, { 'content-length': `${100 * MB + 1}` })).toBe(true);
	expect(refused('POST', '/api/notes/1/evidence/../..', { 'content-length': `${MB}` })).toBe(true);
});

test('a program sends JSON and nothing else', () => {
	const url = '/api/v1/evaluate';
	const length = { 'content-length': '2' };
	for (const kind of [
		'application/json',
		'application/JSON; charset=utf-8',
		'application/x.y+json'
	])
		expect(refused('POST', url, { ...length, 'content-type': kind }), kind).toBe(false);
	for (const kind of ['application/x-www-form-urlencoded', 'text/plain', 'multipart/form-data'])
		expect(refused('POST', url, { ...length, 'content-type': kind }), kind).toBe(true);
	expect(refused('POST', url, length)).toBe(false);
});
