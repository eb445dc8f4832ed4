export type Theme = 'system' | 'light' | 'dark';

const KEY = 'halosieve-theme';

/** Light, dark, or as the system has it; remembered in this browser. */
export class ThemeState {
  chosen = $state<Theme>((localStorage.getItem(KEY) as Theme | null) ?? 'system');
  #systemDark = $state(matchMedia('(prefers-color-scheme: dark)').matches);

  constructor() {
    matchMedia('(prefers-color-scheme: dark)').addEventListener(
      'change',
      ({ matches }) => (this.#systemDark = matches),
    );
  }

  get dark(): boolean {
    return this.chosen === 'system' ? this.#systemDark : this.chosen === 'dark';
  }

  set(theme: Theme): void {
    this.chosen = theme;
    localStorage.setItem(KEY, theme);
  }
}
