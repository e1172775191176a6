import fc, { type Arbitrary } from 'fast-check';
import * as z from 'zod/mini';
import type { Draft } from '../../../src/core/event/entry.ts';
import { factSchema } from '../../../src/core/event/facts.ts';

/** The part of JSON Schema that facts are described with. */
interface Shape {
  readonly type?: string;
  readonly const?: unknown;
  readonly enum?: readonly unknown[];
  readonly anyOf?: readonly Shape[];
  readonly oneOf?: readonly Shape[];
  readonly properties?: Readonly<Record<string, Shape>>;
  readonly required?: readonly string[];
  readonly items?: Shape;
  readonly pattern?: string;
  readonly minLength?: number;
  readonly maxLength?: number;
  readonly minItems?: number;
  readonly maxItems?: number;
  readonly minimum?: number;
  readonly maximum?: number;
}

/** Any text of UTF-16 code units, lone surrogates, control characters and separators among them. */
function texts({ pattern, minLength = 0, maxLength = 1000 }: Shape): Arbitrary<string> {
  if (pattern !== undefined) return fc.stringMatching(new RegExp(pattern));
  const unit = fc.oneof(
    { weight: 4, arbitrary: fc.integer({ min: 32, max: 126 }) },
    fc.integer({ min: 0, max: 0xffff }),
  );
  return fc.array(unit, { minLength, maxLength }).map((units) => String.fromCharCode(...units));
}

function numbers({ type, minimum = -1e9, maximum = 1e9 }: Shape): Arbitrary<number> {
  const whole = fc.integer({ min: Math.ceil(minimum), max: Math.floor(maximum) });
  // JSON knows no negative zero; adding 0 makes it positive.
  const real = fc.double({ min: minimum, max: maximum, noNaN: true }).map((value) => value + 0);
  return type === 'integer' ? whole : fc.oneof(whole, real);
}

function arbitrary(shape: Shape): Arbitrary<unknown> {
  if (shape.const !== undefined) return fc.constant(shape.const);
  if (shape.enum !== undefined) return fc.constantFrom(...shape.enum);
  const choices = shape.anyOf ?? shape.oneOf;
  if (choices !== undefined) return fc.oneof(...choices.map(arbitrary));
  switch (shape.type) {
    case 'string':
      return texts(shape);
    case 'number':
    case 'integer':
      return numbers(shape);
    case 'null':
      return fc.constant(null);
    case 'array':
      return fc.array(arbitrary(shape.items ?? {}), {
        minLength: shape.minItems ?? 0,
        maxLength: Math.min(12, shape.maxItems ?? 12),
      });
    case 'object':
      return fc.record(
        Object.fromEntries(Object.entries(shape.properties ?? {}).map(([key, inner]) => [key, arbitrary(inner)])),
        { requiredKeys: [...(shape.required ?? [])], noNullPrototype: true },
      );
    default:
      throw new Error(`no arbitrary for ${JSON.stringify(shape)}`);
  }
}

/** Any entry that can be written: whatever the facts' schema admits, so a new type of fact is tried at once. */
export const anyDraft = fc
  .tuple(texts({ minLength: 1, maxLength: 64 }), arbitrary(z.toJSONSchema(factSchema) as Shape))
  .map(([batch, fact]) => ({ batch, ...(fact as object) }) as Draft);
