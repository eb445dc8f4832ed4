import type { QuantityColumn } from '../quantities/quantity';

/** Where a value stands on an axis; what is not positive has no place on a logarithmic one. */
export function placeOn(value: number, log: boolean): number {
  if (!log) return value;
  return value > 0 ? Math.log10(value) : Number.NaN;
}

/** A column as it stands on an axis, with its errors. */
export function onAxis(column: QuantityColumn, log: boolean): QuantityColumn {
  if (!log) return column;
  const { values, sigma } = column;
  return {
    values: values.map((value) => placeOn(value, log)),
    sigma: sigma?.map((error, row) => error / (values[row]! * Math.LN10)),
  };
}
