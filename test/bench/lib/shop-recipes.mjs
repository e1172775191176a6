import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** Recipes that differ in hand and machine, ferrule and polish: three are what one bench works by. */
const names = ['pc-2-5-multimode-hand', 'upc-2-5-single-mode-machine', 'apc-1-25-single-mode-machine'];

/** @param {string} root */
export const shopRecipes = (root) => names.map((name) => readFileSync(join(root, 'recipes', `${name}.json`), 'utf8'));
