/** Kinds of unit that the tool converts between. */
export type Dimension =
  | 'angle'
  | 'length'
  | 'magnitude'
  | 'proper motion'
  | 'velocity'
  | 'dex'
  | 'number'
  | 'mass'
  | 'time'
  | 'angular momentum'
  | 'energy';
