import type { Roster, SettledColumn } from '../roster/roster';
import { numberColumn, type NumberColumn, textColumn, type TextColumn } from '../table/column';
import type { MeasuredId } from '../table/role';

/** Which source gave each value of a settled column, under `<name>_source`. */
export function sourceColumn(roster: Roster, name: string, settled: SettledColumn): TextColumn {
  const cells = Array.from(settled.fromSource, (source) => (source < 0 ? undefined : roster.sources[source]));
  return textColumn(`${name}_source`, cells, { description: `Id of the source that gave ${name}` });
}

/** For quantities that can come from several measurements: candidates in the order in which the program takes them. */
const CHOICES: Readonly<Record<string, readonly MeasuredId[]>> = {
  distance: ['distance_modulus', 'distance', 'parallax'],
  a_v: ['a_v', 'ebv'],
};

/** Which measurement each value of a quantity was made from, under `<id>_from`; undefined when there is no choice. */
export function chosenFrom(roster: Roster, id: string, values: Float64Array): TextColumn | undefined {
  const candidates = CHOICES[id]?.flatMap((candidate) => {
    const column = roster.columns.get(candidate);
    return column ? [{ candidate, measured: column.values }] : [];
  });
  if (!candidates) return undefined;
  const usable = (candidate: MeasuredId, value: number): boolean =>
    candidate === 'distance' || candidate === 'parallax' ? value > 0 : !Number.isNaN(value);
  const cells = Array.from({ length: roster.rows }, (_, object) =>
    Number.isNaN(values[object]!)
      ? undefined
      : candidates.find(({ candidate, measured }) => usable(candidate, measured[object]!))?.candidate,
  );
  return textColumn(`${id}_from`, cells, { description: `Measured quantity that ${id} was made from` });
}

/** Line of each object's row in each source's file, under `<source>_line`; missing where the source lacks the object. */
export function lineColumns(roster: Roster): NumberColumn[] {
  return roster.sources.map((source, at) =>
    numberColumn(
      `${source}_line`,
      Float64Array.from(roster.lines[at]!, (line) => (line === 0 ? Number.NaN : line)),
      { description: `Line of the object in the file of source ${source}` },
    ),
  );
}
