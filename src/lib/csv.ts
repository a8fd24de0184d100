/**
 * CSV (RFC 4180) that spreadsheets open as what it is. Attack stopped here: a text that begins like a
 * formula would be run by the spreadsheet of whoever opens the file, so it gets an apostrophe before it.
 */
export type CsvCell = string | number | null;

export function csv(rows: readonly (readonly CsvCell[])[]): string {
	// The mark tells spreadsheets that the bytes are UTF-8.
	return '\ufeff' + rows.map((row) => row.map(cell).join(',') + '\r\n').join('');
}

function cell(value: CsvCell): string {
	if (value === null) return '';
	if (typeof value === 'number') return String(value);
	const text = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
	return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/** The answer that the browser saves under a name. */
export function csvFile(name: string, rows: readonly (readonly CsvCell[])[]): Response {
	return new Response(csv(rows), {
		headers: {
			'content-type': 'text/csv; charset=utf-8',
			'content-disposition': `attachment; filename="${name.replace(/[^\w.-]+/g, '_')}"`
		}
	});
}
