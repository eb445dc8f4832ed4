import { cutKind, CUT_KINDS } from '../../core/cuts/kinds';
import { SOLAR_FRAMES } from '../../core/frame/solarframes';
import { measured } from '../../core/table/role';
import type { Problem } from '../../core/table/problem';
import { problemText } from '../../core/table/wording';
import type { Conflict } from '../../core/roster/roster';
import type {
  BenchView,
  ConflictView,
  CutView,
  FrameView,
  KindView,
  SourceView,
  WordedProblem,
} from '../contract/messages';
import type { Session } from './session';

/** Names travel with every view up to this many objects; beyond, a window asks for the rows it shows. */
const NAMES_UP_TO = 50_000;

/** What of a view does not follow from the session. */
export type BenchFacts = Pick<
  BenchView,
  'revision' | 'recipePath' | 'saved' | 'restored' | 'keptIn' | 'notices' | 'undo' | 'redo' | 'lastEdition'
>;

/** The bench as a window draws it. */
export function benchView(session: Session, facts: BenchFacts): BenchView {
  const { recipe, prepared, result } = session;
  const { roster, quantities } = prepared;
  return {
    ...facts,
    version: session.version,
    recipe,
    invented: recipe.sources.some(({ invented }) => invented),
    sources: recipe.sources.map((source) => sourceView(session, source.id)),
    conflicts: roster.conflicts.map((conflict) => conflictView(conflict, roster.names)),
    duplicates: roster.duplicates,
    quarantine: roster.quarantine.map(({ reason }) => problemText(reason)),
    problems: roster.problems.map(worded),
    quantities: quantities.definitions,
    frames: FRAMES,
    kinds: KINDS,
    cuts: cutViews(session),
    counts: result.counts,
    verdicts: result.verdicts,
    names: roster.rows <= NAMES_UP_TO ? roster.names : [],
    withoutRationale: recipe.ledger.filter((cut) => cut.on && cut.rationale.trim() === '').map(({ id }) => id),
  };
}

/** A problem with its sentence. */
export function worded(problem: Problem): WordedProblem {
  return { ...problem, text: problemText(problem) };
}

function sourceView(session: Session, id: string): SourceView {
  const source = session.recipe.sources.find((candidate) => candidate.id === id)!;
  const { state, columns, problems } = session.sources.get(id)!;
  return {
    source,
    state,
    count: session.prepared.roster.counts.find((count) => count.source === id),
    columns,
    problems: problems.map(worded),
  };
}

function conflictView(conflict: Conflict, names: readonly string[]): ConflictView {
  return { ...conflict, name: names[conflict.object]!, text: conflictText(conflict, names) };
}

/** A conflict as a sentence: both values, where they stand, and which was taken. */
export function conflictText(conflict: Conflict, names: readonly string[]): string {
  const { quantity, chosen, other, sigmas } = conflict;
  const name = names[conflict.object]!;
  if (quantity === 'position') {
    return `${name}: the rows of ${chosen.source} and ${other.source} stand ${chosen.sigma.toFixed(4)}° apart.`;
  }
  const { label, unit } = measured(quantity);
  const value = ({ value, sigma }: Conflict['chosen']): string =>
    `${rounded(value)}${Number.isNaN(sigma) ? '' : ` ± ${rounded(sigma)}`}${unit === '' ? '' : ` ${unit}`}`;
  const apart = Number.isFinite(sigmas) ? `${sigmas.toFixed(1)} combined σ apart` : 'no errors given';
  return `${name}: ${label} ${value(chosen)} (${chosen.source}, line ${chosen.line}; taken) against ${value(other)} (${other.source}, line ${other.line}), ${apart}.`;
}

function rounded(value: number): string {
  return String(Number(value.toPrecision(5)));
}

function cutViews({ recipe, prepared, result }: Session): CutView[] {
  const known = new Set(prepared.quantities.definitions.map(({ id }) => id));
  return recipe.ledger.map((cut, at) => {
    const kind = cutKind(cut.kind);
    return {
      cut,
      attrition: result.attrition[at]!,
      limits: kind.limits(cut.parameters),
      lacking: kind.needs(cut.parameters).filter((id) => !known.has(id)),
    };
  });
}

const FRAMES: readonly FrameView[] = SOLAR_FRAMES.map((frame) => {
  const [x, y, z] = frame.velocityKmS.map((value) => Number(value.toFixed(2)));
  return {
    id: frame.id,
    text: `R0 = ${frame.r0Kpc} kpc, z☉ = ${frame.zSunPc} pc, v☉ = (${x}, ${y}, ${z}) km/s. ${frame.note}`,
    sources: frame.sources,
  };
});

const KINDS: readonly KindView[] = CUT_KINDS.map(({ kind, label, purpose, caution, proposals, defaults }) => ({
  kind,
  label,
  purpose,
  caution,
  proposals,
  defaults,
}));
