/** Faults of an item, and where they lie in its fields. */
import type { Fault, ItemResult } from '$lib/engine/calc/results';
import { faultsOf } from '../figures';

export type FieldFault = { field: string; fault: Fault };

export function itemFaults(result: ItemResult | undefined): FieldFault[] {
	if (!result) return [];
	if (result.kind === 'lineModel') return result.faults;
	const faults = result.kind === 'check' ? result.faults : faultsOf(result.outcome);
	return faults.map((fault) => ({ field: fault.span?.field ?? '', fault }));
}

export function faultSpans(faults: readonly FieldFault[], field: string) {
	return faults.flatMap((fault) =>
		fault.field === field && fault.fault.span ? [fault.fault.span] : []
	);
}
