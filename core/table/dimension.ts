/** Kinds of unit that the tool converts between. */
export type Dimension =
  | 'angle'
  | 'parallax'
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
