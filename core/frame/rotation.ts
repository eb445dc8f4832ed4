/** A 3 × 3 rotation, row-major. */
export type Rotation = readonly [number, number, number, number, number, number, number, number, number];
export type Vector = readonly [number, number, number];

/** Rotation of the axes by an angle (radians) about x, y or z. */
export function aboutX(angle: number): Rotation {
  const [s, c] = [Math.sin(angle), Math.cos(angle)];
  return [1, 0, 0, 0, c, s, 0, -s, c];
}

/** See aboutX. */
export function aboutY(angle: number): Rotation {
  const [s, c] = [Math.sin(angle), Math.cos(angle)];
  return [c, 0, -s, 0, 1, 0, s, 0, c];
}

/** See aboutX. */
export function aboutZ(angle: number): Rotation {
  const [s, c] = [Math.sin(angle), Math.cos(angle)];
  return [c, s, 0, -s, c, 0, 0, 0, 1];
}

/** The product of rotations: the last one acts first. */
export function product(...rotations: readonly Rotation[]): Rotation {
  return rotations.reduce((a, b) => {
    const entry = (row: number, column: number): number =>
      a[3 * row]! * b[column]! + a[3 * row + 1]! * b[3 + column]! + a[3 * row + 2]! * b[6 + column]!;
    return [0, 1, 2].flatMap((row) => [0, 1, 2].map((column) => entry(row, column))) as unknown as Rotation;
  });
}

/** The rotated vector. */
export function rotate(m: Rotation, [x, y, z]: Vector): Vector {
  return [m[0] * x + m[1] * y + m[2] * z, m[3] * x + m[4] * y + m[5] * z, m[6] * x + m[7] * y + m[8] * z];
}

/** The inverse rotation. */
export function inverse(m: Rotation): Rotation {
  return [m[0], m[3], m[6], m[1], m[4], m[7], m[2], m[5], m[8]];
}
