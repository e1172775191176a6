import * as z from 'zod/mini';
import { timePattern } from './clock.ts';

const identifier = z.string().check(z.minLength(1), z.maxLength(64));
const wholeMs = z.int().check(z.nonnegative());

/** What every entry has, of a known type or not. Times in ms, `offset` in minutes east of UTC. */
export const envelopeSchema = z.object({
  log: identifier,
  seq: z.int().check(z.minimum(1)),
  time: z.string().check(z.regex(timePattern)),
  bench: wholeMs,
  wall: wholeMs,
  mono: wholeMs,
  page: identifier,
  offset: z.int().check(z.minimum(-1080), z.maximum(1080)),
  zone: z.string().check(z.maxLength(64)),
  by: z.string().check(z.maxLength(16)),
  batch: identifier,
  type: z.string().check(z.minLength(1), z.maxLength(64)),
  v: z.int().check(z.minimum(1)),
  prev: z.string().check(z.regex(/^[0-9a-f]{64}$/)),
});

/** A stored head. Where it does not fit, its log cannot be continued. */
export const headSchema = z.extend(
  z.pick(envelopeSchema, { log: true, seq: true, time: true, bench: true, wall: true, mono: true, page: true }),
  { hash: envelopeSchema.shape.prev },
);
