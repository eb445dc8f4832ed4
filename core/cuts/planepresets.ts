/** A named reference plane, given by the Galactic direction of its pole. */
export interface PlanePreset {
  readonly id: string;
  readonly label: string;
  readonly poleL: number;
  readonly poleB: number;
  /** Which way the pole points. */
  readonly convention: string;
  readonly source: string;
}

export const PLANE_PRESETS: readonly PlanePreset[] = [
  {
    id: 'sagittarius-stream',
    label: 'Sagittarius stream plane',
    poleL: 273.75,
    poleB: -13.46,
    convention: 'pole of r × v (right-handed); the coordinate B of the stream is positive towards it',
    source: '2010ApJ...714..229L',
  },
  {
    id: 'sagittarius-dwarf',
    label: 'Orbit of the Sagittarius dwarf',
    poleL: 273.88,
    poleB: -11.52,
    convention: 'pole of r × v (right-handed) from the position and velocity of the dwarf; recomputed, frame G18',
    source: '2018A&A...616A..12G',
  },
  {
    id: 'vast-polar-structure',
    label: 'Vast polar structure of satellites',
    poleL: 164.0,
    poleB: -6.9,
    convention: 'normal of a plane fitted to positions: its sense is a choice, so use "either" sense',
    source: 'plane papers of 2015 (bibcode not verified)',
  },
];
