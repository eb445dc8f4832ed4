import type { QuantityColumn } from '../quantities/quantity';

/** Below every positive number on a logarithmic axis. */
const END = Math.log10(Number.MIN_VALUE);

/** Where a vertex stands on an axis; one that is not positive lies at the far end of a logarithmic one. */
export function vertexOn(value: number, log: boolean): number {
  return log ? Math.max(placeOn(value), END) : value;
}

/**
 * A column as it stands on an axis, with its 1σ errors there. On a logarithmic axis a value of 0 or less stands at
 * −∞, outside every shape whatever its error. Errors there are σ/(x ln 10), which is linear: for σ near x and beyond it
 * understates how far the value reaches downwards and overstates it upwards. NaN stays NaN.
 */
export function onAxis(column: QuantityColumn, log: boolean): QuantityColumn {
  if (!log) return column;
  const { values, sigma } = column;
  return {
    values: values.map(placeOn),
    sigma: sigma?.map((error, row) => (values[row]! > 0 ? error / (values[row]! * Math.LN10) : Number.NaN)),
  };
}

function placeOn(value: number): number {
  return value <= 0 ? -Infinity : Math.log10(value);
}
