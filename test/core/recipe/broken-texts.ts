import { longestRecipe } from '../../../src/core/recipe/parse.ts';
import { shippedText } from './shipped.ts';

const good = shippedText('upc-2-5-single-mode-machine.json');
const swap = (from: string, to: string) => good.replace(from, to);

/** Texts that are no recipe, each with what must be said of them. */
export const brokenTexts: readonly {
  readonly what: string;
  readonly text: string;
  readonly problems: readonly string[];
  readonly sentence: string;
}[] = [
  {
    what: 'a text of more than 200,000 characters',
    text: good + ' '.repeat(longestRecipe),
    problems: ['text-too-long '],
    sentence: `The file has ${good.length + longestRecipe} characters; a recipe has at most 200000 characters.`,
  },
  {
    what: 'nothing',
    text: '',
    problems: ['not-json '],
    sentence: 'The file is not JSON: the end of the file at line 1, column 1.',
  },
  {
    what: 'JSON with a comma too many',
    text: '{\n  "format": 1,\n}',
    problems: ['not-json '],
    sentence: 'The file is not JSON: "}" at line 3, column 1.',
  },
  {
    what: 'a decimal comma',
    text: swap('"ferruleMm": 2.5', '"ferruleMm": 2,5'),
    problems: ['not-json '],
    sentence: 'The file is not JSON: "5" at line 14, column 20.',
  },
  {
    what: 'a field that stands twice',
    text: swap('"setPointC": 100', '"setPointC": 100, "setPointC": 120'),
    problems: ['field-twice /steps/10/setPointC'],
    sentence: '"setPointC" stands twice in one object; only one of the two would count.',
  },
  {
    what: 'a list instead of a recipe',
    text: '[]',
    problems: ['wrong-type '],
    sentence: 'The file must be an object, not an empty list.',
  },
  {
    what: 'a missing field',
    text: swap('"revision": "A",', ''),
    problems: ['missing-field /revision'],
    sentence: '"revision" is missing; it must be a text.',
  },
  {
    what: 'a misspelt field',
    text: swap('"repolishLimit": 2', '"repolishLimit": 2, "repolishlimit": 3'),
    problems: ['unknown-field /repolishlimit'],
    sentence: '"repolishlimit" is not a field that stands here; is it misspelt?',
  },
  {
    what: 'a field that would reach a prototype',
    text: swap('"format": 1', '"format": 1, "__proto__": { "id": "x" }'),
    problems: ['unknown-field /__proto__'],
    sentence: '"__proto__" is not a field that stands here; is it misspelt?',
  },
  {
    what: 'a prototype deeper down',
    text: swap('"zirconia"', '"zirconia", "constructor": 1, "__proto__": null'),
    problems: ['unknown-field /fits/constructor', 'unknown-field /fits/__proto__'],
    sentence: '"constructor" is not a field that stands here; is it misspelt?',
  },
  {
    what: 'a number as text',
    text: swap('"ferruleMm": 2.5', '"ferruleMm": "2,5"'),
    problems: ['wrong-type /fits/ferruleMm'],
    sentence: '"ferruleMm" must be a number, not "2,5".',
  },
  {
    what: 'a number too large for any number',
    text: swap('"ferruleMm": 2.5', '"ferruleMm": 1e999'),
    problems: ['wrong-type /fits/ferruleMm'],
    sentence: '"ferruleMm" must be a number, not Infinity.',
  },
  {
    what: 'an oven at 1000 °C',
    text: swap('"setPointC": 100', '"setPointC": 1000'),
    problems: ['out-of-range /steps/10/setPointC'],
    sentence: '"setPointC" must be a number of at most 400, not 1000.',
  },
  {
    what: 'a load of 0',
    text: swap('"loadSize": 12', '"loadSize": 0'),
    problems: ['out-of-range /steps/7/loadSize'],
    sentence: '"loadSize" must be a number of at least 1, not 0.',
  },
  {
    what: 'half a connector',
    text: swap('"loadSize": 12', '"loadSize": 1.5'),
    problems: ['wrong-type /steps/7/loadSize'],
    sentence: '"loadSize" must be a whole number, not 1.5.',
  },
  {
    what: 'a ferrule of nothing',
    text: swap('"ferruleMm": 2.5', '"ferruleMm": 0'),
    problems: ['out-of-range /fits/ferruleMm'],
    sentence: '"ferruleMm" must be a number of more than 0, not 0.',
  },
  {
    what: 'a fibre nobody knows',
    text: swap('"fibreKind": "single-mode"', '"fibreKind": "singlemode"'),
    problems: ['not-allowed /fits/fibreKind'],
    sentence: '"fibreKind" must be one of "single-mode", "multimode", not "singlemode".',
  },
  {
    what: 'a format from later',
    text: swap('"format": 1', '"format": 2'),
    problems: ['not-allowed /format'],
    sentence: '"format" must be 1, not 2.',
  },
  {
    what: 'a step of no known kind',
    text: swap('"kind": "cure"', '"kind": "bake"'),
    problems: ['not-allowed /steps/10/kind'],
    sentence:
      '"kind" must be one of "do", "mix", "cure", "wait", "polish", "inspect", "measure", "hold point", not "bake".',
  },
  {
    what: 'a step without a kind',
    text: swap('"kind": "cure",', ''),
    problems: ['missing-field /steps/10/kind'],
    sentence:
      '"kind" is missing; it must be one of "do", "mix", "cure", "wait", "polish", "inspect", "measure", "hold point".',
  },
  {
    what: 'a label too long for the fibre line',
    text: swap('"label": "Strip"', '"label": "Strip to the length"'),
    problems: ['wrong-length /steps/2/texts/en/label'],
    sentence: '"label" must be a text of at most 14 characters, not "Strip to the length".',
  },
  {
    what: 'an empty label',
    text: swap('"label": "Strip"', '"label": ""'),
    problems: ['wrong-length /steps/2/texts/en/label'],
    sentence: '"label" must be a text that is not empty, not "".',
  },
  {
    what: 'no core at all',
    text: swap('"coresUm": [9]', '"coresUm": []'),
    problems: ['wrong-length /fits/coresUm'],
    sentence: '"coresUm" must be a list of at least 1 entry, not an empty list.',
  },
  {
    what: 'an entry of a list that is no number',
    text: swap('"coresUm": [9]', '"coresUm": [9, null]'),
    problems: ['wrong-type /fits/coresUm/1'],
    sentence: 'Entry 2 of the list must be a number, not null.',
  },
  {
    what: 'an id with a space',
    text: swap('"id": "film-3"', '"id": "film 3"'),
    problems: ['wrong-format /steps/16/id'],
    sentence: '"id" must be small letters and digits in words joined by hyphens, such as "film-3", not "film 3".',
  },
  {
    what: 'a revision in words',
    text: swap('"revision": "A"', '"revision": "first"'),
    problems: ['wrong-format /revision'],
    sentence: '"revision" must be a revision such as "A" or "B.2", not "first".',
  },
  {
    what: 'a basis that is no path',
    text: swap('"path": "/strip"', '"path": "strip"'),
    problems: ['wrong-format /basis/4/path'],
    sentence: '"path" must be a text that begins with "/", not "strip".',
  },
  {
    what: 'a step that is null',
    text: swap('"cautions": ["heat"]', '"cautions": null'),
    problems: ['wrong-type /steps/11/cautions'],
    sentence: '"cautions" must be a list, not null.',
  },
];
