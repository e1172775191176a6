import { describe, expect, test } from 'vitest';
import { filesUnder, read } from './project-files.ts';

const isText = (path: string) => /(\.(ts|mjs|js|json|svelte|css|html|md|svg|webmanifest)|\/run|LICENSE)$/.test(path);

/** Put together from parts, so that this page does not break its own rule. */
const hosts = new RegExp(
  ['npm' + 'js\\.', 'registry' + '\\.[a-z]', 'jsr' + '\\.io', 'un' + 'pkg\\.', 'jsdel' + 'ivr'].join('|'),
);
const machinePath = new RegExp(
  `(^|[\\s'"\`(=:])/(${['wo' + 'rk', 'ho' + 'me', 'ro' + 'ot', 'Us' + 'ers'].join('|')})/[\\w.]`,
);
const leftover = new RegExp(`\\b(${['TO' + 'DO', 'FIX' + 'ME', 'XX' + 'X'].join('|')})\\b|\\bissue #?\\d`);

const rules: readonly (readonly [name: string, pattern: RegExp, planted: string])[] = [
  ['no host of a package registry', hosts, `see https://registry${'.'}example.org/zod`],
  ['no path of one machine', machinePath, `"/ho${'me'}/someone/lintfree"`],
  ['no leftover note', leftover, `// TO${'DO'}: later`],
];

describe('no text carries what belongs elsewhere', () => {
  const texts = filesUnder('')
    .filter((path) => isText(path) && path !== 'package-lock.json')
    .map((path) => ({ path, lines: read(path).split('\n') }));

  test.each(rules)('%s', (_name, pattern, planted) => {
    expect(texts.length).toBeGreaterThan(80);
    expect(planted).toMatch(pattern);
    const found = texts.flatMap(({ path, lines }) =>
      lines.flatMap((line, index) => (pattern.test(line) ? [`${path}:${index + 1}: ${line.trim()}`] : [])),
    );
    expect(found).toEqual([]);
  });

  test('an address inside the app is no path of a machine', () => {
    expect("href('#/work/12')").not.toMatch(machinePath);
  });
});
