import type { QuantityDefinition } from '../../quantities/quantity';
import { html, type Html } from './html';

const UNITS: Readonly<Record<string, string>> = { deg: '°', 'kpc.km/s': 'kpc km/s' };
const SUBSCRIPT = /^(.+)_([^_\s]+)$/;

/** Unit as it is read: "°", "kpc km/s". */
export function unitText(unit: string): string {
  return UNITS[unit] ?? unit;
}

/** A number in words with its unit; degrees stand close to it. */
export function withUnit(number: string, unit: string): string {
  const text = unitText(unit);
  return text === '' || text === '°' ? `${number}${text}` : `${number} ${text}`;
}

/** Label of a quantity with its unit in an SVG text, the part behind an underscore lowered. */
export function svgLabel(definition: QuantityDefinition): Html {
  const unit = definition.unit === '' ? '' : ` (${unitText(definition.unit)})`;
  const parts = SUBSCRIPT.exec(definition.label);
  if (!parts) return html`${definition.label}${unit}`;
  return html`${parts[1]}<tspan class="low" dy="4">${parts[2]}</tspan><tspan dy="-4">${unit}</tspan>`;
}

/** Label of a quantity without unit in plain text. */
export function plainLabel(definition: QuantityDefinition | undefined, id: string): string {
  return definition?.label ?? id;
}
