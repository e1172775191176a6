/** Light for a bright shop, dark, or as the tablet says. */
export const themes = ['light', 'dark', 'auto'] as const;
export type Theme = (typeof themes)[number];

export interface ThemeWindow {
  readonly document: { readonly documentElement: { readonly dataset: DOMStringMap } };
  readonly localStorage: Pick<Storage, 'getItem' | 'setItem'>;
}

/** static/theme.js reads the same key before the first paint, and takes the same value where nothing is kept. */
const key = 'lintfree-theme';
const usual: Theme = 'light';

export function readTheme({ localStorage }: ThemeWindow = globalThis.window): Theme {
  const kept = localStorage.getItem(key);
  return themes.find((theme) => theme === kept) ?? usual;
}

/** Shows it at once and keeps it for the next start. */
export function setTheme(theme: Theme, { document, localStorage }: ThemeWindow = globalThis.window): void {
  document.documentElement.dataset['theme'] = theme;
  localStorage.setItem(key, theme);
}
