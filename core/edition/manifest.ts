import { cutKind } from '../cuts/kinds';
import { EDITION_FILES } from './contents';
import { type EditionInput, inventedSources } from './edition';
import { frameOf } from './framewords';
import { jsonText } from './jsontext';

/** Version of the form of edition.json. */
export const MANIFEST_VERSION = 1;

/** Text of edition.json: what the edition says of itself to programs. null stands for what is not known. */
export function manifestText(input: EditionInput): string {
  const { recipe, roster, judged, number, time, program } = input;
  const frame = frameOf(recipe.frame);
  return jsonText({
    halosieve: 'edition',
    version: MANIFEST_VERSION,
    number,
    time,
    program,
    title: recipe.title,
    author: recipe.author,
    note: recipe.note,
    inventedSources: inventedSources(input),
    counts: judged.counts,
    sources: input.sources.map((source) => {
      const about = recipe.sources.find(({ id }) => id === source.id);
      const rows = roster.counts.find((count) => count.source === source.id);
      return {
        id: source.id,
        fileName: source.fileName,
        sha256: source.sha256,
        bytes: source.bytes,
        rowsRead: source.rowsRead,
        objectRows: rows?.objectRows,
        duplicates: rows?.duplicates,
        quarantine: rows?.quarantine,
        title: about?.title,
        citation: about?.citation,
        invented: about?.invented,
      };
    }),
    frame: {
      id: frame.id,
      r0Kpc: frame.r0Kpc,
      r0Sigma: frame.r0Sigma,
      zSunPc: frame.zSunPc,
      zSunSigma: frame.zSunSigma,
      velocityKmS: frame.velocityKmS,
      velocitySigma: frame.velocitySigma,
      lsrSpeedKmS: frame.lsrSpeedKmS,
      sources: frame.sources,
      note: frame.note,
    },
    attrition: judged.attrition.map(({ cut, ...row }, at) => ({
      cut,
      kind: cutKind(recipe.ledger[at]!.kind).kind,
      ...row,
    })),
    conflicts: roster.conflicts.map(({ object, quantity, chosen, other, sigmas }) => ({
      key: roster.keys[object],
      name: roster.names[object],
      quantity,
      chosen,
      other,
      sigmas,
    })),
    files: EDITION_FILES,
  });
}
