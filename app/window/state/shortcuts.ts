interface Actions {
  undo(): void;
  redo(): void;
  open(): void;
  save(): void;
}

/** Key presses of the whole window: Ctrl or Cmd with Z, Shift+Z or Y, O, S. Text fields keep their own undo. */
export function shortcuts(actions: Actions): (event: KeyboardEvent) => void {
  return (event) => {
    if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
    const key = event.key.toLowerCase();
    const typing =
      event.target instanceof HTMLTextAreaElement ||
      (event.target instanceof HTMLInputElement && event.target.type === 'text');
    const action =
      key === 'z'
        ? event.shiftKey
          ? 'redo'
          : 'undo'
        : key === 'y'
          ? 'redo'
          : key === 'o'
            ? 'open'
            : key === 's'
              ? 'save'
              : undefined;
    if (action === undefined || (typing && (action === 'undo' || action === 'redo'))) return;
    event.preventDefault();
    actions[action]();
  };
}
