/**
 * Version of the engine, sealed into baselines. It goes up when results say more than before, or something else.
 *
 *     1    figures
 *     2    standard uncertainties follow from those of the givens
 *     3    lists of values; temperatures on a scale with its own zero have no multiples
 */
export const ENGINE_VERSION = '3';

/** Whether the engine of that version told the uncertainties of what follows from givens. */
export const propagatesUncertainty = (version: string): boolean => Number(version) >= 2;
