import type { Refusal } from '../core/command/refusal.ts';
import type { Words } from './index.ts';

/** The sentence for a refusal in a language. */
export function refusalSentence(words: Words, refusal: Refusal): string {
  const sentence = words.refusal[refusal.code] as (refused: Refusal) => string;
  return sentence(refusal);
}
