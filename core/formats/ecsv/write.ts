import { cellText, type Column } from '../../table/column';
import { portableUnit } from './unit';
import { yamlMap, yamlText } from './yaml';

/** A column with what an ECSV header says beside its name, unit and description. */
export interface EcsvColumn {
  readonly column: Column;
  /** UCD1+ word; '' when there is none. */
  readonly ucd: string;
  /** Whether every value is an integer below 2^53 or missing. */
  readonly integer: boolean;
}

/**
 * A table as ECSV 1.0, line by line: YAML header (in ASCII, so that no reader has to guess an encoding), comma as the
 * declared delimiter, numbers with their shortest text that reads back to the same double, missing cells empty.
 *
 * Texts are always quoted, which also keeps a name that begins with # from being taken as a comment; line breaks in
 * them become blanks, because readers of ECSV work line by line. A unit that standard readers would warn of goes into
 * the description instead. `about` becomes the meta of the table.
 */
export function* ecsvText(
  columns: readonly EcsvColumn[],
  rows: Iterable<number>,
  about: Readonly<Record<string, string | boolean>>,
): Generator<string> {
  yield "# %ECSV 1.0\n# ---\n# delimiter: ','\n# datatype:\n";
  for (const column of columns) yield `# - ${columnHeader(column)}\n`;
  yield `# meta: !!omap\n`;
  for (const [key, value] of Object.entries(about)) yield `# - ${yamlMap([[key, value]])}\n`;
  yield '# schema: astropy-2.0\n';
  yield `${columns.map(({ column }) => textCell(column.name)).join(',')}\n`;
  for (const row of rows) {
    yield `${columns.map(({ column }) => (column.type === 'text' ? textCell(cellText(column, row)) : numberCell(column, row))).join(',')}\n`;
  }
}

function columnHeader({ column, ucd, integer }: EcsvColumn): string {
  const { name, unit = '' } = column;
  const safe = portableUnit(unit);
  const odd = unit !== '' && safe === undefined ? `unit as the source writes it: ${unit}` : '';
  const description = [column.description ?? '', odd].filter((part) => part !== '').join('; ');
  const datatype = column.type === 'text' ? 'string' : integer ? 'int64' : 'float64';
  const parts = [`name: ${yamlText(name)}`];
  if (safe !== undefined) parts.push(`unit: ${yamlText(safe)}`);
  parts.push(`datatype: ${datatype}`);
  if (description !== '') parts.push(`description: ${yamlText(description)}`);
  if (ucd !== '') parts.push(`meta: !!omap [${yamlMap([['ucd', ucd]])}]`);
  return `{${parts.join(', ')}}`;
}

function textCell(text: string): string {
  if (text === '') return '';
  return `"${text.replaceAll('"', '""').replace(/[\r\n]+/g, ' ')}"`;
}

function numberCell(column: Column, row: number): string {
  const text = cellText(column, row);
  if (text === 'Infinity') return 'inf';
  return text === '-Infinity' ? '-inf' : text;
}
