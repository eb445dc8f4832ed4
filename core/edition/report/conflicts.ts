import type { Conflict, ConflictValue } from '../../roster/roster';
import { measured } from '../../table/role';
import type { EditionInput } from '../edition';
import { measuredText, plainText } from '../rounded';
import { unitText } from './axislabel';
import { html, type Html } from './html';
import { firstRows, table } from './table';

const MOST = 100;

/** Values on which sources disagree, the worst first. */
export function conflictsSection({ roster, recipe }: EditionInput): Html {
  const worst = [...roster.conflicts].sort((a, b) => b.sigmas - a.sigmas);
  const { shown, rest } = firstRows(worst, MOST, 'edition.json');
  return html`<section aria-labelledby="conflicts">
    <h2 id="conflicts">Conflicts</h2>
    ${
      shown.length === 0
        ? html`<p>No two sources differ by more than ${recipe.roster.conflictSigma} combined σ.</p>`
        : html`${table(
            `Values that differ by more than ${recipe.roster.conflictSigma} combined σ; the taken one is that of the more trusted source`,
            [
              { text: 'Object' },
              { text: 'Quantity' },
              { text: 'Taken', number: true },
              { text: 'from' },
              { text: 'Other', number: true },
              { text: 'from' },
              { text: 'Difference', number: true },
            ],
            shown.map((conflict) => row(conflict, roster.names[conflict.object]!)),
          )}${rest}`
    }
  </section>`;
}

function row(conflict: Conflict, name: string): (string | Html)[] {
  const { chosen, other, quantity, sigmas } = conflict;
  const from = ({ source, line }: ConflictValue): string => `${source}, line\u00a0${line}`;
  if (quantity === 'position') {
    const apart = `${plainText(chosen.sigma)}° apart`;
    return [name, 'position', '', from(chosen), '', from(other), apart];
  }
  const { label, unit } = measured(quantity);
  const words = ({ value, sigma }: ConflictValue): string => measuredText(value, sigma);
  const size = Number.isFinite(sigmas) ? `${plainText(Number(sigmas.toPrecision(2)))} σ` : 'no errors given';
  return [
    name,
    `${label}${unit === '' ? '' : ` (${unitText(unit)})`}`,
    words(chosen),
    from(chosen),
    words(other),
    from(other),
    size,
  ];
}
