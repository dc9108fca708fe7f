/**
 * Signed contribution of one independent source to the uncertainty of a value: the change of the value when the
 * source moves by its standard uncertainty, in the value's unit. Values that share a source move together.
 */
export interface Contribution {
  readonly source: string;
  readonly c: number;
}
