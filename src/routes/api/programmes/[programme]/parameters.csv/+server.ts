import { csvFile } from '$lib/csv';
import { requireProgramme } from '$lib/server/auth/guard';
import { parameterTable, parametersOf } from '$lib/server/baselines/parameters';

export async function GET(event) {
	const { programme } = await requireProgramme(event, event.params.programme, 'baseline.read');
	const parameters = await parametersOf(programme.id);
	return csvFile(`${programme.code} parameters.csv`, parameterTable(programme.code, parameters));
}
