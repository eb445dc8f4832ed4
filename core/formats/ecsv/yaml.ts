/** A double-quoted YAML scalar in plain ASCII: read alike by YAML 1.1 and 1.2, and never taken for a date, number or yes. */
export function yamlText(text: string): string {
  const escaped = JSON.stringify(text).replace(/[^\x20-\x7e]/gu, (character) => {
    const code = character.codePointAt(0)!;
    return code > 0xffff ? `\\U${code.toString(16).padStart(8, '0')}` : `\\u${code.toString(16).padStart(4, '0')}`;
  });
  return escaped;
}

/** A YAML flow map of one-line entries. */
export function yamlMap(entries: readonly (readonly [string, string | boolean])[]): string {
  const parts = entries.map(
    ([key, value]) => `${key}: ${typeof value === 'boolean' ? String(value) : yamlText(value)}`,
  );
  return `{${parts.join(', ')}}`;
}
