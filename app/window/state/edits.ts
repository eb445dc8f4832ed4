const open = new Set<() => boolean>();

/**
 * Makes a field known that may hold text nobody has sent yet. `commit` sends it, and says false for text that it cannot
 * read. Returns a function that sends for the last time and
 * takes the field off the list.
 */
export function registerField(commit: () => boolean): () => void {
  open.add(commit);
  return () => {
    commit();
    open.delete(commit);
  };
}

/** Sends what stands unsent in any field; false when one holds what cannot be read. */
export function commitFields(): boolean {
  return [...open].map((commit) => commit()).every(Boolean);
}
