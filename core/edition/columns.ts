import type { EcsvColumn } from '../formats/ecsv/write';
import type { QuantityDefinition } from '../quantities/quantity';
import type { SettledColumn } from '../roster/roster';
import { type Column, numberColumn, textColumn } from '../table/column';
import { measured, type MeasuredId } from '../table/role';
import { decisionColumns, dropColumns } from './decisions';
import type { EditionInput } from './edition';
import { chosenFrom, lineColumns, sourceColumn } from './provenance';

/** A column of the data files, with what its document says of it. */
export type EditionColumn = EcsvColumn;

const plain = (column: Column, ucd = ''): EditionColumn => ({ column, ucd, integer: false });

/**
 * Columns of the sample, over all objects: key, name, verdict and the cuts it rests on, every quantity with its error,
 * every measured value with its source, and each object's line in each source.
 */
export function sampleColumns(input: EditionInput): EditionColumn[] {
  return [...identityColumns(input), ...decisionColumns(input).map((column) => plain(column)), ...valueColumns(input)];
}

/** Columns of the objects that are not in the sample: those of the sample and why each is not in it. */
export function droppedColumns(sample: readonly EditionColumn[], input: EditionInput): EditionColumn[] {
  const after = sample.findIndex(({ column }) => column.name === 'verdict') + 1;
  return [...sample.slice(0, after), ...dropColumns(input).map((column) => plain(column)), ...sample.slice(after)];
}

function identityColumns({ roster }: EditionInput): EditionColumn[] {
  return [
    plain(
      textColumn('key', roster.keys, { description: 'Stable key: the cleaned name, unique in the roster' }),
      'meta.id;meta.main',
    ),
    plain(textColumn('name', roster.names, { description: 'Name as the source writes it' }), 'meta.id'),
  ];
}

function valueColumns(input: EditionInput): EditionColumn[] {
  const { quantities, roster } = input;
  const quantityIds = new Set(quantities.definitions.map(({ id }) => id));
  const behind = [...roster.columns].filter(([id]) => !quantityIds.has(id));
  return [
    ...quantities.definitions.flatMap((definition) => quantityColumns(input, definition)),
    ...behind.flatMap(([id, settled]) => settledColumns(input, id, id, settled)),
    ...lineColumns(roster).map((column) => ({ column, ucd: 'meta.number', integer: true })),
  ];
}

function quantityColumns(input: EditionInput, definition: QuantityDefinition): EditionColumn[] {
  const found = input.quantities.column(definition.id);
  if (found === undefined) return [];
  const { id, ucd, unit, description } = definition;
  const settled = input.roster.columns.get(id as MeasuredId);
  // The program has not touched a column that is still the roster's own array.
  if (settled?.values === found.values) return settledColumns(input, id as MeasuredId, id, settled);
  const from = chosenFrom(input.roster, id, found.values);
  return [
    plain(numberColumn(id, found.values, { unit, description }), ucd),
    ...errorColumn(`${id}_error`, found.sigma, id, unit, ucd),
    ...(from ? [plain(from)] : []),
    ...(settled ? settledColumns(input, id as MeasuredId, `${id}_measured`, settled) : []),
  ];
}

/** A measured column as the roster settled it: value, errors, and the source of each value. */
function settledColumns(input: EditionInput, id: MeasuredId, name: string, settled: SettledColumn): EditionColumn[] {
  const { unit, ucd, description } = measured(id);
  const said =
    name === id ? description : `${description}, before the program chose between measurements or rescaled them`;
  return [
    plain(numberColumn(name, settled.values, { unit, description: said }), ucd),
    ...errorColumn(`${name}_error`, settled.sigma, name, unit, ucd),
    ...(asymmetric(settled)
      ? [
          ...errorColumn(`${name}_error_minus`, settled.minus, name, unit, ucd, 'downwards'),
          ...errorColumn(`${name}_error_plus`, settled.plus, name, unit, ucd, 'upwards'),
        ]
      : []),
    plain(sourceColumn(input.roster, name, settled), 'meta.ref'),
  ];
}

function asymmetric({ minus, plus }: SettledColumn): boolean {
  return minus?.some((down, object) => down !== plus?.[object] && !Number.isNaN(down)) ?? false;
}

/** A column of errors; none when no error of any object is known. */
function errorColumn(
  name: string,
  values: Float64Array | undefined,
  of: string,
  unit: string,
  ucd: string,
  side = '',
): EditionColumn[] {
  if (values === undefined || values.every(Number.isNaN)) return [];
  const description = `1 sigma error of ${of}${side === '' ? '' : ` ${side}`}`;
  return [
    plain(
      numberColumn(name, values, { unit, description }),
      ucd === '' ? '' : `stat.error;${ucd.replace(';meta.main', '')}`,
    ),
  ];
}
