import * as z from 'zod/mini';

// Compiling checks at run time would break the page's content security policy.
z.config({ jitless: true });

/**
 * The shape of a recipe file. Shape only, without transforms or refinements: what a recipe must mean is checked by
 * the rules beside this file. Every number carries its unit in its field's name.
 */

const text = (longest: number) => z.string().check(z.minLength(1), z.maxLength(longest));
const identifier = z.string().check(z.regex(/^[a-z0-9]+(-[a-z0-9]+)*$/), z.maxLength(40));
const positive = z.number().check(z.positive(), z.maximum(1e6));
const notNegative = z.number().check(z.nonnegative(), z.maximum(1e6));
const celsius = z.number().check(z.minimum(-60), z.maximum(400));
const count = z.int().check(z.minimum(1), z.maximum(1000));

export const cautions = ['bare glass', 'solvent', 'adhesive', 'heat', 'invisible light', 'dust'] as const;
export const languages = ['en'] as const;

const lengthMm = z.strictObject({ nominalMm: positive, toleranceMm: notNegative });

const stepTexts = z.strictObject({
  en: z.strictObject({
    /** Large heading: what to do. */
    title: text(60),
    /** Under the bead on the fibre line: one or two words. */
    label: text(14),
    /** What the main action records, as a past participle: "stripped" in "8 stripped, next". */
    done: text(24),
    /** Short sentences for the bench. */
    notes: z.array(text(160)).check(z.maxLength(6)),
  }),
});

const stepBase = {
  id: identifier,
  texts: stepTexts,
  goes: z.enum(['batch by batch', 'load by load', 'connector by connector']),
  /** The most connectors that one load holds; for steps that go load by load. */
  loadSize: z.optional(count),
  standard: z.strictObject({ setupS: notNegative, eachS: notNegative }),
  cautions: z.array(z.enum(cautions)),
  /** Which findings at this step send a connector back, and to which earlier step. */
  sendsBack: z.array(z.strictObject({ defect: identifier, to: identifier })),
};

const doStep = z.strictObject({
  ...stepBase,
  kind: z.literal('do'),
  picture: z.enum(['none', 'strip', 'parts', 'fill', 'crimp', 'cleave', 'clean']),
});
const mixStep = z.strictObject({
  ...stepBase,
  kind: z.literal('mix'),
  /** The step that must be finished before the working life is over. */
  limits: identifier,
});
const cureStep = z.strictObject({ ...stepBase, kind: z.literal('cure'), setPointC: celsius });
const waitStep = z.strictObject({ ...stepBase, kind: z.literal('wait'), atLeastS: positive });
const polishStep = z.strictObject({
  ...stepBase,
  kind: z.literal('polish'),
  filmUm: positive,
  filmMaterial: z.enum(['aluminium oxide', 'silicon carbide', 'diamond', 'silica']),
  pad: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('rubber'), hardnessMinShoreA: positive, hardnessMaxShoreA: positive }),
    z.strictObject({ kind: z.literal('glass') }),
    z.strictObject({ kind: z.literal('hand, in air') }),
  ]),
  forceMinN: notNegative,
  forceMaxN: positive,
  until: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('time'), aimS: positive, toleranceS: positive }),
    z.strictObject({ kind: z.literal('strokes'), figureEights: count }),
    z.strictObject({ kind: z.literal('look'), sign: text(80) }),
  ]),
  liquid: z.enum(['none', 'water']),
  usesPerSheet: count,
});
const inspectStep = z.strictObject({
  ...stepBase,
  kind: z.literal('inspect'),
  criterion: text(60),
  magnification: positive,
});
const measureStep = z.strictObject({
  ...stepBase,
  kind: z.literal('measure'),
  readings: z.array(
    z.strictObject({
      quantity: z.enum([
        'loss',
        'return loss',
        'radius of curvature',
        'apex offset',
        'fibre height',
        'polish angle',
        'key error',
      ]),
      /** Wavelength, where the quantity has one. */
      wavelengthNm: z.optional(positive),
      unit: z.enum(['dB', 'mm', 'um', 'nm', 'deg']),
      lowest: z.optional(z.number()),
      highest: z.optional(z.number()),
    }),
  ),
});
const holdStep = z.strictObject({ ...stepBase, kind: z.literal('hold point'), asks: text(200) });

export const stepSchema = z.discriminatedUnion('kind', [
  doStep,
  mixStep,
  cureStep,
  waitStep,
  polishStep,
  inspectStep,
  measureStep,
  holdStep,
]);

export const recipeSchema = z.strictObject({
  /** Where an editor finds the JSON Schema of this file; means nothing to the bench. */
  $schema: z.optional(text(200)),
  format: z.literal(1),
  id: identifier,
  revision: z.string().check(z.regex(/^[A-Z0-9][A-Z0-9.-]{0,9}$/)),
  /** "starting values" until the shop has qualified the process. */
  status: z.enum(['starting values', 'qualified by the shop']),
  texts: z.strictObject({ en: z.strictObject({ name: text(60), summary: text(240) }) }),
  fits: z.strictObject({
    ferruleMm: positive,
    ferruleMaterial: z.enum(['zirconia', 'stainless steel']),
    boreMinUm: positive,
    boreMaxUm: positive,
    fibreKind: z.enum(['single-mode', 'multimode']),
    /** One or more nominal core diameters that this recipe serves. */
    coresUm: z.array(positive).check(z.minLength(1)),
    claddingUm: positive,
    coatingUm: positive,
    bufferUm: positive,
    cableJacketsMm: z.array(positive).check(z.minLength(1)),
    jacketColour: z.enum(['yellow', 'orange', 'aqua', 'slate', 'violet', 'lime']),
    polish: z.enum(['PC', 'UPC', 'APC', 'flat']),
    angleDeg: notNegative,
    terminus: z.nullable(z.strictObject({ channels: count, name: text(60) })),
  }),
  strip: z.strictObject({
    jacketOffMm: lengthMm,
    strengthMemberMm: lengthMm,
    bareGlassMm: lengthMm,
  }),
  adhesive: z.strictObject({
    name: text(80),
    workingLifeMinutes: positive,
    workingLifeAtC: celsius,
    /** Activation energy that shortens the working life in a warmer room; null: the life is taken as fixed. */
    workingLifeActivationKJPerMol: z.nullable(positive),
    curePairs: z
      .array(z.strictObject({ temperatureC: celsius, minutes: positive }))
      .check(z.minLength(1), z.maxLength(12)),
    /** Where the pairs were computed from one pair and an activation energy rather than given by a maker. */
    curePairsComputedFrom: z.nullable(
      z.strictObject({ temperatureC: celsius, minutes: positive, activationKJPerMol: positive }),
    ),
    lowestC: celsius,
    highestC: celsius,
    /** Dose past which the adhesive counts as over-cured; 1 is a full cure. */
    longestDose: z.number().check(z.minimum(1), z.maximum(100)),
    handlingC: celsius,
  }),
  retermination: z.strictObject({ cableMm: positive, parts: z.array(text(60)) }),
  repolishLimit: z.int().check(z.minimum(0), z.maximum(10)),
  defects: z.array(z.strictObject({ code: identifier, texts: z.strictObject({ en: text(40) }) })).check(z.minLength(1)),
  materials: z.array(z.strictObject({ en: text(120) })),
  tools: z.array(z.strictObject({ en: text(120) })),
  steps: z.array(stepSchema).check(z.minLength(1), z.maxLength(40)),
  /** What each field rests on; a path covers everything beneath it. */
  basis: z.array(
    z.strictObject({
      path: z.string().check(z.startsWith('/')),
      rests: z.enum(['common practice, no source', 'from memory', 'published', 'computed']),
      source: z.optional(text(200)),
    }),
  ),
});

export type Recipe = z.infer<typeof recipeSchema>;
export type Step = z.infer<typeof stepSchema>;
export type StepKind = Step['kind'];
export type StepOf<Kind extends StepKind> = Extract<Step, { kind: Kind }>;
export type Language = (typeof languages)[number];
export type Caution = (typeof cautions)[number];
