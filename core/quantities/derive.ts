import { phaseCovariance } from '../frame/covariance';
import { phaseOf, type Observed, type Phase } from '../frame/phase';
import { type Sky, skyOf } from '../frame/sky';
import type { SolarFrame } from '../frame/solarframes';
import { freshColumn, type MakeColumn } from '../table/columnpool';
import type { NumberColumn } from '../table/column';
import type { MeasuredTable } from '../table/measured';
import type { MeasuredId } from '../table/role';
import { heliocentricDistance } from './distance';
import { type ExtinctionLaw, extinctionV, recalibratedExcess } from './extinction';
import { galacticColumns } from './galactic';
import type { GalactocentricState, Kernel } from './kernel';
import { momentaOf } from './momenta';
import { MOMENTUM_KERNELS } from './momentum';
import { motionsOf } from './motions';
import { placesOf } from './places';
import { POSITION_KERNELS } from './position';
import { sigmasOf } from './propagate';
import type { QuantityColumn, QuantityDefinition, QuantitySet } from './quantity';
import { DERIVED, MEASURED_QUANTITIES } from './registry';
import { VELOCITY_KERNELS } from './velocity';

const KERNELS: Readonly<Record<string, Kernel>> = { ...POSITION_KERNELS, ...VELOCITY_KERNELS, ...MOMENTUM_KERNELS };

export interface DeriveOptions extends ExtinctionLaw {
  readonly frame: SolarFrame;
  /** Where columns come from; each is its own when left out. */
  readonly make?: MakeColumn;
  /** Further columns, carried along under their own names. */
  readonly extras?: readonly NumberColumn[];
}

/**
 * All quantities that measured columns can give, each computed when first asked for.
 *
 * Missing stays missing: a row without line-of-sight velocity has positions and no velocities. Errors are propagated
 * linearly through the full 6 × 6 covariance (see `phaseCovariance`); the frame is taken as exact.
 */
export function deriveQuantities(measured: MeasuredTable, options: DeriveOptions): QuantitySet {
  const state = lazyState(measured, options.frame, options.make ?? freshColumn);
  const extras = new Map((options.extras ?? []).map((column) => [column.name, column]));
  const columns = new Map<string, QuantityColumn | undefined>();

  function compute(id: string): QuantityColumn | undefined {
    const kernel = KERNELS[id];
    if (kernel) return fromKernel(kernel, state);
    switch (id) {
      case 'gal_l':
        return state.galactic()?.l;
      case 'gal_b':
        return state.galactic()?.b;
      case 'distance':
        return state.distance();
      case 'a_v':
        return extinctionV(measured, options);
      case 'ebv':
        return recalibratedExcess(measured, options);
      default:
        return extras.get(id) ?? measured.columns.get(id as MeasuredId);
    }
  }

  const definitions = [
    ...MEASURED_QUANTITIES.filter(({ id }) => measured.columns.has(id as MeasuredId)),
    ...DERIVED.filter(({ id }) => available(id, measured)),
    ...[...extras.values()].map(carried),
  ];
  const known = new Set(definitions.map(({ id }) => id));
  return {
    rows: measured.rows,
    definitions,
    column(id) {
      if (!known.has(id)) return undefined;
      if (!columns.has(id)) columns.set(id, compute(id));
      return columns.get(id);
    },
    phaseCovariance: () => state.covariance(),
  };
}

function fromKernel(kernel: Kernel, state: State): QuantityColumn | undefined {
  const there = state.galactocentric();
  if (!there) return undefined;
  const covariance = state.covariance();
  const values = kernel.values(there);
  return { values, sigma: covariance && sigmasOf(kernel.gradient(there), kernel.moving, covariance, there.make) };
}

function carried(column: NumberColumn): QuantityDefinition {
  return {
    id: column.name,
    label: column.name,
    unit: column.unit ?? '',
    ucd: '',
    description: column.description ?? 'Carried along from the source as it stands there',
    origin: 'carried',
  };
}

function available(id: string, { columns }: MeasuredTable): boolean {
  const has = (...ids: readonly MeasuredId[]): boolean => ids.some((candidate) => columns.has(candidate));
  if (id === 'a_v') return has('a_v', 'ebv');
  const far = has('distance_modulus', 'distance', 'parallax');
  if (id === 'distance') return far;
  const placed = has('ra') && has('dec');
  if (id === 'gal_l' || id === 'gal_b') return placed;
  const moving = KERNELS[id]?.moving ?? false;
  return placed && far && (!moving || (has('pm_ra') && has('pm_dec') && has('v_los')));
}

interface State {
  distance(): QuantityColumn | undefined;
  galactic(): ReturnType<typeof galacticColumns> | undefined;
  galactocentric(): GalactocentricState | undefined;
  covariance(): Float64Array | undefined;
}

function lazyState(measured: MeasuredTable, frame: SolarFrame, make: MakeColumn): State {
  const values = (id: MeasuredId): Float64Array | undefined => measured.columns.get(id)?.values;
  const sigma = (id: MeasuredId): Float64Array | undefined => measured.columns.get(id)?.sigma;
  const distance = once(() => heliocentricDistance(measured, make));
  const sky = once((): Sky | undefined => {
    const [ra, dec] = [values('ra'), values('dec')];
    return ra && dec && skyOf(ra, dec, make);
  });
  const observed = once((): Observed | undefined => {
    const [directions, far] = [sky(), distance()];
    if (!directions || !far) return undefined;
    return {
      sky: directions,
      distance: far.values,
      pmRa: values('pm_ra'),
      pmDec: values('pm_dec'),
      vLos: values('v_los'),
    };
  });
  return {
    distance,
    galactic: once(() => {
      const directions = sky();
      return directions && galacticColumns(directions, sigma('ra'), sigma('dec'), make);
    }),
    galactocentric: once(() => {
      const seen = observed();
      return seen && stateOf(phaseOf(seen, frame, make), make);
    }),
    covariance: once(() => {
      const [seen, far] = [observed(), distance()?.sigma];
      if (!seen || !far || far.every(Number.isNaN)) return undefined;
      const errors = {
        ra: sigma('ra'),
        dec: sigma('dec'),
        distance: far,
        pmRa: sigma('pm_ra'),
        pmDec: sigma('pm_dec'),
        pmCorrelation: values('pm_correlation'),
        vLos: sigma('v_los'),
      };
      return phaseCovariance(seen, errors, frame, make);
    }),
  };
}

function stateOf(phase: Phase, make: MakeColumn): GalactocentricState {
  const places = once(() => placesOf(phase, make));
  const momenta = once(() => momentaOf(phase, make));
  return { phase, make, places, momenta, motions: once(() => motionsOf(phase, places(), momenta(), make)) };
}

function once<T>(make: () => T): () => T {
  let made: { value: T } | undefined;
  return () => (made ??= { value: make() }).value;
}
