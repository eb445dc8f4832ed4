interface LimitField {
  readonly parameter: string;
  readonly label: string;
  readonly unit: string;
}

/** Limits of each kind that can be switched on and off, as fields. */
const FIELDS: Readonly<Record<string, readonly LimitField[]>> = {
  metallicity: [
    { parameter: 'max', label: '[Fe/H] at most', unit: '' },
    { parameter: 'min', label: '[Fe/H] at least', unit: '' },
  ],
  extinction: [
    { parameter: 'ebvMax', label: 'E(B−V) at most', unit: 'mag' },
    { parameter: 'avMax', label: 'A_V at most', unit: 'mag' },
    { parameter: 'absBMin', label: '|b| at least', unit: 'deg' },
  ],
  disc: [
    { parameter: 'absZMin', label: 'disc-like below |z|', unit: 'kpc' },
    { parameter: 'cylRMin', label: 'disc-like within R', unit: 'kpc' },
    { parameter: 'vPhiMax', label: 'disc-like above v_φ', unit: 'km/s' },
    { parameter: 'toomreMin', label: 'disc-like below Toomre speed', unit: 'km/s' },
  ],
  range: [
    { parameter: 'min', label: 'at least', unit: '' },
    { parameter: 'max', label: 'at most', unit: '' },
  ],
  plane: [],
};

/** The limit fields of a cut with their values; null is switched off. */
export function offLimits(
  kind: string,
  parameters: Readonly<Record<string, unknown>>,
): (LimitField & { value: number | null })[] {
  return (FIELDS[kind] ?? []).map((field) => ({ ...field, value: parameters[field.parameter] as number | null }));
}
