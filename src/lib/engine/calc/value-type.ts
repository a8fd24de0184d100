/** How a value is typed: its dimension, which kind of temperature it is if it is one, and whether it is a list. */
import type { Dimension } from '../quantities/dimension';

/**
 * Temperatures on a scale with a zero of its own (20 °C) are points; what lies between two of them is
 * a difference. A kelvin may be either ("plain"), as may everything that is no temperature.
 */
export type Scale = 'plain' | 'point' | 'difference';

/** A list has many values, all of one dimension. */
export type ValueType = { kind: 'value'; dimension: Dimension; scale: Scale; list: boolean };
export type Type = ValueType | { kind: 'truth' };

export const valueType = (
	dimension: Dimension,
	scale: Scale = 'plain',
	list = false
): ValueType => ({ kind: 'value', dimension, scale, list });
