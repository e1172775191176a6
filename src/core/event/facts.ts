import * as z from 'zod/mini';

// Compiling checks at run time would break the page's content security policy.
z.config({ jitless: true });

/**
 * What an entry can say: type, version and data. Stored text is the record; these schemas only read it.
 * A changed shape gets a new version beside the old one, never a changed old one.
 */

const text = (longest: number) => z.string().check(z.maxLength(longest));
const name = z.string().check(z.minLength(1), z.maxLength(80));
const identifier = z.string().check(z.minLength(1), z.maxLength(64));
const seconds = z.number().check(z.nonnegative(), z.maximum(400 * 86400));
const celsius = z.number().check(z.minimum(-60), z.maximum(400));
const connectors = z.array(z.int().check(z.minimum(1), z.maximum(1000))).check(z.minLength(1), z.maxLength(1000));

/** How long ago it happened, where it was entered later; past 120 s it says why. */
const late = { ago: z.optional(seconds), agoReason: z.optional(text(200)) };
/** Seconds since the same person's previous entry on this tablet: the ground of the hands-on estimate. */
const gap = { gap: z.optional(seconds) };

const fact = <Type extends string, Data extends z.core.$ZodLooseShape>(type: Type, data: Data) =>
  z.object({ type: z.literal(type), v: z.literal(1), data: z.object(data) });

export const factSchema = z.discriminatedUnion('type', [
  // Bench-wide
  fact('tabletStarted', { app: text(60) }),
  fact('clockSet', {}),
  fact('tabletWoke', {}),
  fact('timeStated', { addedS: seconds }),
  fact('benchSet', {
    tablet: name,
    operators: z.array(z.string().check(z.minLength(1), z.maxLength(4))).check(z.maxLength(40)),
    shifts: z
      .array(
        z.object({
          name,
          from: z.string().check(z.regex(/^\d\d:\d\d$/)),
          to: z.string().check(z.regex(/^\d\d:\d\d$/)),
        }),
      )
      .check(z.maxLength(6)),
  }),
  fact('shiftChanged', { operator: z.string().check(z.minLength(1), z.maxLength(4)), shift: text(80) }),
  fact('recipeTaken', {
    hash: z.string().check(z.regex(/^[0-9a-f]{64}$/)),
    text: z.string().check(z.maxLength(200000)),
  }),
  fact('adhesiveMixed', {
    mix: identifier,
    adhesive: name,
    lot: text(60),
    roomC: z.nullable(celsius),
    workingLifeS: seconds,
    ...late,
    ...gap,
  }),
  fact('ovenSet', { oven: identifier, name, setPointC: celsius, warmUpS: z.nullable(seconds), ...late }),
  fact('ovenRead', { oven: identifier, temperatureC: celsius, ...late }),
  fact('ovenDisturbed', { oven: identifier, what: z.enum(['door opened', 'power cut']), ...late }),
  // Batch
  fact('batchOpened', {
    tag: z.int().check(z.minimum(1), z.maximum(12)),
    workOrder: name,
    recipe: z.string().check(z.regex(/^[0-9a-f]{64}$/)),
    connectors: z
      .array(
        z.object({
          serial: z.optional(text(40)),
          end: z.optional(z.enum(['A', 'B'])),
          fibre: z.optional(z.int().check(z.minimum(1), z.maximum(1000))),
        }),
      )
      .check(z.minLength(1), z.maxLength(1000)),
  }),
  fact('stepFinished', {
    step: identifier,
    connectors,
    /** The mix that these connectors take with them; only at a mix step. */
    mix: z.optional(identifier),
    /** Finished after the working life was over. */
    overrun: z.optional(z.object({ lateS: seconds, reason: text(200) })),
    ...late,
    ...gap,
  }),
  fact('mixChanged', { mix: identifier, connectors, ...gap }),
  fact('loadStarted', { load: identifier, step: identifier, connectors, station: text(64), ...late, ...gap }),
  fact('loadEnded', {
    load: identifier,
    verdict: z.enum(['in time', 'early', 'over']),
    /** Frozen at the end of a cure. */
    dose: z.optional(z.number()),
    coldestC: z.optional(z.number()),
    /** Seconds past the moment when it was due; negative when early. */
    lateS: z.number(),
    reason: z.optional(text(200)),
    ...late,
    ...gap,
  }),
  fact('judged', {
    step: identifier,
    connectors,
    verdict: z.enum(['pass', 'fail']),
    defect: z.optional(identifier),
    ...late,
    ...gap,
  }),
  fact('sentBack', {
    connectors,
    to: identifier,
    defect: identifier,
    /** "new": cut off and begun anew with a new connector part, so the attempt number rises. */
    attempt: z.enum(['same', 'new']),
    ...late,
    ...gap,
  }),
  fact('scrapped', { connectors, defect: identifier, ...late, ...gap }),
  fact('clockSeen', { clock: identifier, lateS: z.number() }),
  fact('batchHeld', { reason: text(200) }),
  fact('batchResumed', {}),
  fact('tagChanged', { tag: z.int().check(z.minimum(1), z.maximum(12)) }),
  fact('batchClosed', { how: z.enum(['complete', 'short']), defect: z.optional(identifier) }),
  // Either
  fact('voided', {
    targets: z.array(z.object({ log: identifier, seq: z.int().check(z.minimum(1)) })).check(z.minLength(1)),
    reason: text(200),
  }),
]);

export type Fact = z.infer<typeof factSchema>;
export type FactType = Fact['type'];
export type FactOf<Type extends FactType> = Extract<Fact, { type: Type }>;
