/**
 * What a study acts on: figures that follow from the givens. `x` holds the givens in their order; the model
 * writes its outputs to `y`, and throws `Refused` where there is no result. A method of the catalogue is
 * one, and so is a note's sheet.
 */
export type Model = (x: Float64Array, y: Float64Array) => void;
