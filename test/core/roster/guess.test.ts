// The headers are of the kinds that published tables of clusters, satellites and halo stars use (common practice).
import { describe, expect, it } from 'vitest';
import { readDelimited } from '../../../core/formats/csv/read';
import { type Guess, guessMeanings } from '../../../core/roster/guess';

async function guesses(text: string): Promise<Map<string, Guess>> {
  async function* chunks(): AsyncGenerator<Uint8Array> {
    yield new TextEncoder().encode(text);
    await Promise.resolve();
  }
  const { table } = await readDelimited(chunks(), { fileName: 'table.csv' });
  return new Map(guessMeanings(table).map((guess) => [guess.column, guess]));
}

/** Roles by column; "role unit" where a unit is guessed. */
async function rolesOf(header: string, ...rows: string[]): Promise<Record<string, string>> {
  const found = await guesses(`${[header, ...rows].join('\n')}\n`);
  return Object.fromEntries([...found].map(([column, { role, unit }]) => [column, unit ? `${role} ${unit}` : role]));
}

describe('headers of published tables', () => {
  it('equatorial positions, modulus and motions with their errors', async () => {
    expect(
      await rolesOf(
        'Name,RAJ2000,DEJ2000,(m-M)0,e_(m-M)0,pmRA,e_pmRA,pmDE,e_pmDE,HRV,e_HRV,[Fe/H],E(B-V)',
        'A,10.5,-20.1,15.2,0.1,1.2,0.05,-2.1,0.05,120,1.5,-1.4,0.05',
        'B,210.5,45,17.2,0.1,-0.2,0.05,0.1,0.05,-80,2,-2.1,0.02',
      ),
    ).toEqual({
      Name: 'name',
      RAJ2000: 'ra deg',
      DEJ2000: 'dec deg',
      '(m-M)0': 'distance_modulus mag',
      'e_(m-M)0': 'distance_modulus_error mag',
      pmRA: 'pm_ra mas/yr',
      e_pmRA: 'pm_ra_error mas/yr',
      pmDE: 'pm_dec mas/yr',
      e_pmDE: 'pm_dec_error mas/yr',
      HRV: 'v_los km/s',
      e_HRV: 'v_los_error km/s',
      '[Fe/H]': 'feh dex',
      'E(B-V)': 'ebv mag',
    });
  });

  it('units in brackets, errors below and above, a correlation', async () => {
    expect(
      await rolesOf(
        'id,ra [rad],dec [rad],distance_pc,distance_pc_em,distance_pc_ep,pmra,pmdec,pmra_pmdec_corr,RV [m/s],A_V',
        '1,0.5,-0.2,12000,500,700,1,2,0.3,120000,0.4',
        '2,1.5,0.2,82000,5000,7000,-1,0,-0.1,-45000,0.1',
      ),
    ).toEqual({
      id: 'name',
      'ra [rad]': 'ra rad',
      'dec [rad]': 'dec rad',
      distance_pc: 'distance pc',
      distance_pc_em: 'distance_error_minus pc',
      distance_pc_ep: 'distance_error_plus pc',
      pmra: 'pm_ra mas/yr',
      pmdec: 'pm_dec mas/yr',
      pmra_pmdec_corr: 'pm_correlation',
      'RV [m/s]': 'v_los m/s',
      A_V: 'a_v mag',
    });
  });

  it('Galactic positions alone, sexagesimal positions, and a parallax alone', async () => {
    expect(await rolesOf('Cluster,l,b,Rsun', 'A,305.9,-44.9,4.5', 'B,152.3,-89.4,8.9')).toEqual({
      Cluster: 'name',
      l: 'gal_l deg',
      b: 'gal_b deg',
      Rsun: 'distance kpc',
    });
    const found = await rolesOf('name,ra,dec,plx', 'A,00 24 05.6,-72 04 52,0.2', 'B,13 26 47.2,-47 28 46,0.19');
    expect(found).toEqual({ name: 'name', ra: 'ra h:m:s', dec: 'dec d:m:s', plx: 'parallax mas' });
  });
});

describe('what is doubtful', () => {
  it('a distance beside a modulus, a parallax beside a distance and Galactic beside equatorial positions are set aside, with the reason', async () => {
    const found = await guesses(
      'name,ra,dec,l,b,DM,dist,parallax\nA,10,20,120,-40,15,10,0.1\nB,50,20,160,-30,16,15.8,0.06\n',
    );
    for (const column of ['l', 'b', 'dist', 'parallax']) {
      expect(found.get(column)).toMatchObject({ role: 'ignore', confidence: 0 });
      expect(found.get(column)!.reason).toMatch(/from which|biased/);
    }
  });

  it('of two columns for one role one is taken, and the other says so', async () => {
    const found = await guesses('name,ra,RAJ2000,dec\nA,10,10.1,20\nB,50,50.1,20\n');
    const [taken, other] = [found.get('ra')!, found.get('RAJ2000')!];
    expect([taken.role, other.role]).toEqual(['ra', 'ignore']);
    expect(other.reason).toMatch(/"ra" is the better column/);
  });

  it('a unit that is none of the role’s, and values that cannot be, take the role away', async () => {
    const found = await guesses('name,ra,dec,distance [km/s],feh\nA,10,20,4,120\nB,50,20,5,310\nC,60,20,6,250\n');
    expect(found.get('distance [km/s]')).toMatchObject({ role: 'ignore' });
    expect(found.get('distance [km/s]')!.reason).toMatch(/not its unit "km\/s"/);
    expect(found.get('feh')).toMatchObject({ role: 'ignore' });
    expect(found.get('feh')!.reason).toMatch(/not its values/);
  });

  it('one stray value does not change the unit, and is said', async () => {
    const found = await guesses('name,ra,dec\nA,10,20\nB,400,30\nC,60,-20\nD,70,-25\n');
    expect(found.get('ra')).toMatchObject({ role: 'ra', unit: 'deg' });
    expect(found.get('ra')!.reason).toMatch(/1 cannot be/);
    expect(found.get('ra')!.confidence).toBeLessThan(found.get('dec')!.confidence);
  });

  it('an error without its value, an unknown name and an empty column have no role', async () => {
    const found = await guesses('name,ra,dec,e_rv,flag,feh\nA,10,20,4,x,\nB,50,20,5,y,\n');
    for (const column of ['e_rv', 'flag', 'feh']) expect(found.get(column)!.role, column).toBe('ignore');
    expect(found.get('e_rv')!.reason).toMatch(/v_los/);
  });

  it('every guess has a reason and a confidence that fits', async () => {
    for (const guess of (await guesses('name,ra,dec,x\nA,10,20,1\n')).values()) {
      expect(guess.reason.length).toBeGreaterThan(5);
      expect(guess.confidence >= 0 && guess.confidence <= 1).toBe(true);
      expect(guess.role === 'ignore').toBe(guess.confidence < 0.5);
    }
  });
});
