/** The API's page and its OpenAPI description say what the routes do. */
import { readFileSync } from 'node:fs';
import { Validator } from '@seriousme/openapi-schema-validator';
import { format, resolveConfig } from 'prettier';
import { expect, test } from 'vitest';
import { openApi } from '$lib/server/engine/openapi';
import { apiTables } from '../setup/api-page';

const PAGE = 'docs/api.md';
/** Below it the page follows from the descriptions; `-u` writes it anew. */
const MARK =
	'<!-- What follows is made from the descriptions: npx vitest run tests/process/api-page.spec.ts -u -->\n';

test('the page has every operation, problem, method, input and output as they are', async () => {
	const page = readFileSync(PAGE, 'utf8');
	expect(page).toContain(MARK);
	const prose = page.slice(0, page.indexOf(MARK) + MARK.length);
	const options = { ...(await resolveConfig(PAGE)), filepath: PAGE };
	const wanted = await format(`${prose}\n${apiTables()}\n`, options);
	await expect(wanted).toMatchFileSnapshot(`../../${PAGE}`);
});

test('the description is valid OpenAPI 3.1', async () => {
	const validator = new Validator();
	const found = await validator.validate(JSON.parse(JSON.stringify(openApi())));
	expect(found.errors).toBeUndefined();
	expect([found.valid, validator.version]).toEqual([true, '3.1']);
});

test('every reference in the description leads somewhere', () => {
	const text = JSON.stringify(openApi());
	const whole = JSON.parse(text);
	for (const [, path] of text.matchAll(/"\$ref":"#\/([^"]+)"/g)) {
		const found = path!.split('/').reduce((part, key) => part?.[key], whole);
		expect(found, path).toBeDefined();
	}
});
