// @vitest-environment jsdom
import { describe, expect, test } from 'vitest';
import { citationAddress } from '../../../core/edition/report/citation';
import { axisOf, tickText } from '../../../core/edition/report/axis';
import { reportText } from '../../../core/edition/report/page';
import { MOST_MARKS } from '../../../core/edition/report/platefigure';
import { cut, editionInput, smallRecipe, source } from './fixture';

const square: [number, number][] = [
  [-2, 1],
  [-1, 1],
  [-1, 60],
];
const recipe = smallRecipe({
  title: 'A & B <script>alert(1)</script>',
  author: '"><img src=x onerror=alert(1)>',
  ledger: [
    cut('metals', 'metallicity', { min: null, max: -1 }, { evidence: ['10.1234/a', '2010ApJ...714..229L'] }),
    cut(
      'shape',
      'lasso',
      { x: 'feh', y: 'r', xLog: false, yLog: true, polygon: square, action: 'keep' },
      { on: false },
    ),
    cut('eye', 'named', {
      objects: [
        { key: 'ember3', name: '=Ember 3', action: 'keep', reason: '<b>bold</b>' },
        { key: 'nowhere', name: 'Nowhere', action: 'drop', reason: 'gone' },
      ],
    }),
  ],
  plates: [
    { id: 'a "quoted" id', x: 'gal_l', y: 'gal_b' },
    { id: 'metals', x: 'r', y: 'feh' },
    { id: 'lost', x: 'r', y: 'age' },
  ],
});
const text = reportText(editionInput(recipe));
const parsed = (html: string): Document => new DOMParser().parseFromString(html, 'text/html');
const document = parsed(text);

describe('the report', () => {
  test('runs no script, loads nothing, and forbids both', () => {
    expect(document.querySelectorAll('script, link, img, iframe, object, [src], [onerror], [onload]')).toHaveLength(0);
    expect(text).not.toMatch(/url\((?!#)|@import|javascript:/);
    expect(document.querySelector('meta[http-equiv]')?.getAttribute('content')).toContain("default-src 'none'");
  });

  test('shows text of the user as text', () => {
    expect(document.querySelector('h1')?.textContent).toBe(recipe.title);
    expect(document.querySelector('.byline')?.textContent).toContain(recipe.author);
    expect(document.body.textContent).toContain('<b>bold</b>');
  });

  test('has unique ids, one main heading and no heading level left out', () => {
    const ids = [...document.querySelectorAll('[id]')].map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    const levels = [...document.querySelectorAll('h1, h2, h3, h4')].map(({ tagName }) => Number(tagName[1]));
    expect(levels.filter((level) => level === 1)).toHaveLength(1);
    levels.forEach((level, at) => expect(level - (levels[at - 1] ?? 0)).toBeLessThanOrEqual(1));
  });

  test('every table has a caption and scoped headers, every figure a title and a description', () => {
    for (const table of document.querySelectorAll('table')) {
      expect(table.caption?.textContent).not.toBe('');
      expect(table.querySelectorAll('th:not([scope])')).toHaveLength(0);
    }
    for (const figure of document.querySelectorAll('figure > svg')) {
      expect(figure.querySelector(':scope > title')?.textContent).not.toBe('');
      expect(figure.querySelector(':scope > desc')?.textContent).not.toBe('');
    }
  });

  test('gives the attrition, the reasons and links to the evidence', () => {
    const rows = [...document.querySelectorAll('#attrition ~ .wide tbody tr')].map((row) => row.textContent);
    expect(rows[0]).toContain('[Fe/H] ≤ −1');
    expect(rows[1]).toContain('(off)');
    expect(document.body.textContent).toContain('reason of metals');
    expect(document.querySelector('a[href="https://doi.org/10.1234/a"]')).not.toBeNull();
  });

  test('names the borderline objects with the deciding value, and the objects decided by eye', () => {
    const row = (section: string, name: string): string =>
      [...document.querySelectorAll(`#${section} ~ .wide tr`)].find((one) => one.textContent.includes(name))!
        .textContent;
    expect(row('borderline', 'Ember 2')).toContain('[Fe/H] = −1.02 ± 0.05, kept when ≤ −1');
    expect(row('named', '=Ember 3')).toContain('fails metals');
    expect(row('named', 'Nowhere')).toContain('no object of the roster');
  });

  test('conflicts, duplicates and quarantine are told', () => {
    const said = document.body.textContent;
    expect(said).toMatch(/Ember 2.*\[Fe\/H\].*−1\.02 ± 0\.05.*near, line\u00a03.*−1\.90 ± 0\.05.*far, line\u00a02/s);
    expect(said).toContain('cinder 09');
    expect(said).toContain('The row has 2 cells where the header has 8 cells');
  });

  test('a plate that the data cannot give says so', () => {
    expect(document.querySelector('.plates')?.textContent).toContain('The data cannot give the plate of age against r');
  });

  test('each object with both values has one mark, of the shape of its standing', () => {
    const sky = document.querySelectorAll('.plate')[0]!;
    const marks = [...sky.querySelectorAll('svg[role="img"] g.mark path > title')].map(
      ({ textContent }) => textContent,
    );
    expect(marks.toSorted()).toEqual([...editionInput(recipe).roster.names].toSorted());
    const dropped = sky
      .querySelector('g.dropped path')
      ?.getAttribute('d')
      ?.replace(/^M\S+ \S+?(?=m)/, '');
    const kept = sky
      .querySelector('g.kept path')
      ?.getAttribute('d')
      ?.replace(/^M\S+ \S+?(?=m)/, '');
    expect(dropped).not.toBe(kept);
  });

  test('the limit of a cut is drawn where its quantity is an axis, a lasso that is off is not', () => {
    const [sky, metals] = document.querySelectorAll('.plate');
    expect(sky!.querySelector('.guide')?.getAttribute('d')).toBe('');
    expect(metals!.querySelector('.guide')?.getAttribute('d')).toMatch(/^M62 [\d.]+H468$/);
    expect(metals!.textContent).toContain('limits of metals');
  });

  test('invented data are said before everything else', () => {
    const invented = { ...recipe, sources: recipe.sources.map((one) => ({ ...one, invented: true })) };
    const page = parsed(reportText(editionInput(invented)));
    expect(page.querySelector('header')?.firstElementChild?.textContent).toContain('Invented data: near, far');
  });
});

describe('a report of very many objects', () => {
  const count = MOST_MARKS + 1;
  const at = Array.from({ length: count }, (_, object) => object / count);
  const many = source(
    'near',
    at.map((_, object) => `S ${object}`),
    {
      ra: [at.map((share) => 360 * share)],
      dec: [at.map((share) => 160 * ((share * 97) % 1) - 80)],
      distance_modulus: [at.map((share) => 15 + 3 * share), at.map(() => 0.1)],
      feh: [at.map((share) => -2.5 + 2 * ((share * 31) % 1)), at.map(() => 0.1)],
    },
  );

  test('draws a density and stays small', () => {
    const page = reportText(editionInput(smallRecipe(), [many]));
    expect(page).toContain('class="density level0"');
    expect(page).not.toContain('class="mark kept" d="M6');
    expect(page.length).toBeLessThan(500_000);
  });
});

describe('axes', () => {
  test.each([
    [[], [0, 1]],
    [[Number.NaN], [0, 1]],
    [
      [5, 5],
      [5, 5],
    ],
    [
      [1e6, 1e6 + 1e-9],
      [1e6, 1e6],
    ],
    [
      [0, 0.001],
      [0, 0.001],
    ],
    [
      [-1e6, 3e6],
      [-1e6, 3e6],
    ],
  ])('of %j hold their values and at least two ticks', (values, [least, greatest]) => {
    const axis = axisOf(values, 'kpc');
    expect(axis.min).toBeLessThan(least!);
    expect(axis.max).toBeGreaterThan(greatest!);
    expect(axis.ticks.length).toBeGreaterThanOrEqual(2);
    const texts = axis.ticks.map((tick) => tickText(axis, tick));
    expect(new Set(texts).size).toBe(texts.length);
    texts.forEach((label, index) => expect(Number(label.replace('−', '-'))).toBeCloseTo(axis.ticks[index]!, 9));
  });

  test('of a whole circle are divided as circles are', () => {
    expect(axisOf([0, 360], 'deg').ticks).toEqual([0, 90, 180, 270, 360]);
  });
});

describe('citations', () => {
  test.each([
    ['10.1086/118116', 'https://doi.org/10.1086/118116'],
    ['doi:10.1086/118116', 'https://doi.org/10.1086/118116'],
    ['2018A&A...615L..15G', 'https://ui.adsabs.harvard.edu/abs/2018A%26A...615L..15G'],
    ['arXiv:0801.1232', 'https://arxiv.org/abs/0801.1232'],
    ['https://example.org/a', 'https://example.org/a'],
    ['javascript:alert(1)', undefined],
    ['common practice, no source', undefined],
    ['', undefined],
  ])('%j leads to %j', (cited, address) => {
    expect(citationAddress(cited)).toBe(address);
  });
});
