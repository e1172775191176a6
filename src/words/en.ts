import { alarm } from './en/alarm.ts';
import { batch } from './en/batch.ts';
import { bench } from './en/bench.ts';
import { cautions } from './en/cautions.ts';
import { common } from './en/common.ts';
import { newBatch } from './en/new-batch.ts';
import { number } from './en/number.ts';
import { ovens } from './en/ovens.ts';
import { picture } from './en/picture.ts';
import { recipes } from './en/recipes.ts';
import { refusal } from './en/refusal.ts';
import { settings } from './en/settings.ts';
import { shift } from './en/shift.ts';

/** Every word of the interface, in English. Recipe texts carry their languages in the recipe. */
export const en = {
  recipes,
  common,
  bench,
  batch,
  newBatch,
  number,
  picture,
  alarm,
  cautions,
  refusal,
  ovens,
  settings,
  shift,
};
