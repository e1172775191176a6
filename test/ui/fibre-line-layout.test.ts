import fc from 'fast-check';
import { expect, test } from 'vitest';
import { layoutFibreLine, type Bead, type BeadState } from '../../src/ui/fibre-line-layout.ts';

const state = fc.constantFrom<BeadState>('done', 'current', 'running', 'waiting', 'over', 'to do');
const bead: fc.Arbitrary<Bead> = fc.record({
  kind: fc.constantFrom('step' as const, 'timed' as const),
  share: fc.double({ min: 0, max: 1e5, noNaN: true }),
  state,
  label: fc.string({ minLength: 1, maxLength: 14, unit: 'grapheme-ascii' }),
  count: fc.option(fc.integer({ min: 1, max: 1000 }), { nil: undefined }),
  progress: fc.option(fc.double({ min: -1, max: 2, noNaN: true }), { nil: undefined }),
});
const scene = fc.record({
  beads: fc.array(bead, { maxLength: 40 }),
  width: fc.integer({ min: 180, max: 1600 }),
  labelSizePx: fc.integer({ min: 15, max: 20 }),
});
const slack = 1e-6;

test('labels never touch one another and never leave the drawing', () => {
  fc.assert(
    fc.property(scene, ({ beads, width, labelSizePx }) => {
      const { labels } = layoutFibreLine(beads, { width, labelSizePx, overWord: 'over' });
      labels.forEach((label, index) => {
        expect(label.centre - label.width / 2).toBeGreaterThanOrEqual(-slack);
        expect(label.centre + label.width / 2).toBeLessThanOrEqual(width + slack);
        const before = labels[index - 1];
        if (before === undefined) return;
        expect(label.centre - label.width / 2).toBeGreaterThanOrEqual(before.centre + before.width / 2 + 12 - slack);
      });
    }),
    { numRuns: 500 },
  );
});

test('beads keep their order, keep apart, and stay between buffer and ferrule', () => {
  fc.assert(
    fc.property(scene, ({ beads, width, labelSizePx }) => {
      const layout = layoutFibreLine(beads, { width, labelSizePx, overWord: 'over' });
      expect(layout.beads).toHaveLength(beads.length);
      layout.beads.forEach(({ from, to, litTo, ring }, index) => {
        const left = Math.min(from, (ring?.x ?? from) - (ring?.radius ?? 0));
        const right = Math.max(to, (ring?.x ?? to) + (ring?.radius ?? 0));
        expect(left).toBeGreaterThanOrEqual(layout.bufferTo - slack);
        expect(right).toBeLessThanOrEqual(layout.ferruleFrom + slack);
        expect(litTo).toBeGreaterThanOrEqual(from - slack);
        expect(litTo).toBeLessThanOrEqual(to + slack);
        const before = layout.beads[index - 1];
        if (before !== undefined) {
          const edge = Math.max(before.to, before.ring === null ? before.to : before.ring.x + before.ring.radius);
          expect(left).toBeGreaterThanOrEqual(edge - slack);
        }
      });
    }),
    { numRuns: 500 },
  );
});

const plain = (label: string, state: BeadState, more: Partial<Bead> = {}): Bead => ({
  kind: 'step',
  share: 0,
  state,
  label,
  ...more,
});
const room = { width: 620, labelSizePx: 17, overWord: 'over' };
const words = (beads: Bead[]): string[] => layoutFibreLine(beads, room).labels.map(({ payload }) => payload.text);

test('only the last done, the current and the next step are named', () => {
  const beads = [
    plain('Prep', 'done'),
    plain('Strip', 'done'),
    plain('Clean', 'current'),
    plain('Fill', 'to do'),
    plain('Cure', 'to do'),
  ];
  expect(words(beads)).toEqual(['Strip', 'Clean', 'Fill']);
});

test('what is over says so in a word', () => {
  expect(words([plain('Cure', 'over', { kind: 'timed', share: 1 })])).toEqual(['Cure, over']);
});

test('a batch in several places rings each, with its count', () => {
  const beads = [
    plain('Fill', 'current', { count: 2 }),
    plain('Cure', 'to do'),
    plain('Polish', 'current', { count: 10 }),
  ];
  expect(layoutFibreLine(beads, room).beads.map(({ ring }) => ring?.count ?? null)).toEqual(['2', null, '10']);
});

test('a count that has no room in its ring stands in the label', () => {
  const beads = [plain('Fill', 'current', { count: 2 }), plain('Polish', 'current', { count: 120 })];
  expect(words(beads)).toEqual(['Fill', 'Polish 120']);
});

test('a stretch is as long as its share of the time', () => {
  const timed = (share: number): Bead => plain('x', 'to do', { kind: 'timed', share });
  const [short, long] = layoutFibreLine([timed(1), timed(3)], room).beads.map(({ from, to }) => to - from);
  expect((long ?? 0) / (short ?? 1)).toBeCloseTo(3, 0);
});

test('light has gone as far as the progress says', () => {
  const [cure] = layoutFibreLine([plain('Cure', 'running', { kind: 'timed', share: 1, progress: 0.5 })], room).beads;
  expect(cure?.litTo).toBeCloseTo(((cure?.from ?? 0) + (cure?.to ?? 0)) / 2, 6);
});
