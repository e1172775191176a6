import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { recipeJsonSchema } from '../../../src/core/recipe/json-schema.ts';
import { shippedFiles, shippedText } from './shipped.ts';

const schemaFile = new URL('../../../static/recipe-schema.json', import.meta.url);

test('static/recipe-schema.json is current: npm run --silent recipes -- --schema > static/recipe-schema.json', () => {
  expect(readFileSync(schemaFile, 'utf8')).toBe(recipeJsonSchema());
});

test('every object in it refuses unknown fields', () => {
  const loose: string[] = [];
  const visit = (value: unknown, path: string): void => {
    if (typeof value !== 'object' || value === null) return;
    if ('properties' in value && !('additionalProperties' in value && value.additionalProperties === false))
      loose.push(path);
    for (const [key, inner] of Object.entries(value)) visit(inner, `${path}/${key}`);
  };
  visit(JSON.parse(recipeJsonSchema()), '');
  expect(loose).toEqual([]);
});

test.each(shippedFiles)('%s points an editor at it', (file) => {
  expect(JSON.parse(shippedText(file))).toMatchObject({ $schema: '../static/recipe-schema.json' });
});
