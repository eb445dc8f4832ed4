import { html, type Html } from './html';

const DOI = /^(?:doi:\s*|https?:\/\/(?:dx\.)?doi\.org\/)?(10\.\d{4,9}\/\S+)$/i;
const BIBCODE = /^\d{4}[A-Za-z&.]{5}[A-Za-z0-9.]{9}[A-Z:.]$/;
const ARXIV = /^(?:arXiv:\s*)?(\d{4}\.\d{4,5}(?:v\d+)?|[a-z-]+\/\d{7})$/i;
const ADDRESS = /^https?:\/\/[^\s<>"]+$/i;

/** Where a DOI, bibcode, arXiv id or web address leads; undefined for any other text. */
export function citationAddress(text: string): string | undefined {
  const cited = text.trim();
  const doi = DOI.exec(cited)?.[1];
  if (doi !== undefined) return `https://doi.org/${encodeURI(doi)}`;
  if (BIBCODE.test(cited)) return `https://ui.adsabs.harvard.edu/abs/${encodeURIComponent(cited)}`;
  const arxiv = ARXIV.exec(cited)?.[1];
  if (arxiv !== undefined) return `https://arxiv.org/abs/${arxiv}`;
  return ADDRESS.test(cited) ? cited : undefined;
}

/** A citation as a link where it can be one. */
export function citation(text: string): Html {
  const address = citationAddress(text);
  return address === undefined ? html`${text}` : html`<a href="${address}" rel="noreferrer">${text.trim()}</a>`;
}

/** Several citations, separated by semicolons. */
export function citations(texts: readonly string[]): Html {
  return html`${texts.map((text, at) => html`${at === 0 ? '' : '; '}${citation(text)}`)}`;
}
