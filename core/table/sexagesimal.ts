const SEPARATORS =
  /^\s*([+\-−]?)\s*(\d{1,3})\s*[:hd°\s]\s*(\d{1,2})\s*(?:[:m'′\s]\s*(\d{1,2}(?:\.\d*)?)\s*[s"″]?)?\s*$/i;

/**
 * Degrees of a sexagesimal text such as "12:34:56.7", "-00 30 12" or "5h 17m 3.2s"; `hours` multiplies by 15.
 * NaN when the text is not of that form or minutes or seconds reach 60. The sign belongs to the whole, also at −00.
 */
export function degreesFromSexagesimal(text: string, hours: boolean): number {
  const match = SEPARATORS.exec(text);
  if (!match) return Number.NaN;
  const [whole, minutes, seconds] = [Number(match[2]), Number(match[3]), Number(match[4] ?? 0)];
  if (minutes >= 60 || seconds >= 60) return Number.NaN;
  const size = (whole + minutes / 60 + seconds / 3600) * (hours ? 15 : 1);
  return match[1] === '-' || match[1] === '−' ? -size : size;
}
