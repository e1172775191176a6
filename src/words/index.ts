import { en } from './en.ts';

/** Every language has the same words: one that is missing does not compile. */
export type Words = typeof en;

export const languages = { en } satisfies Record<string, Words>;
