/** Keys of the rows that are written with each append, so that a start need not read history. */
export const rowKeys = {
  /** Which of the logs here this tablet writes. */
  own: 'own',
  wide: 'wide',
  recipes: 'recipe:',
  recipe: (hash: string) => `recipe:${hash}`,
} as const;
