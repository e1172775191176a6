import { placeLabels, type PlacedLabel } from './label-layout.ts';
import { textWidthPx } from './text-width.ts';

export type BeadState = 'done' | 'current' | 'running' | 'waiting' | 'over' | 'to do';

/** One step on the fibre line. */
export interface Bead {
  readonly kind: 'step' | 'timed';
  /** Length of a timed bead relative to the other timed ones. */
  readonly share: number;
  readonly state: BeadState;
  /** One or two words. */
  readonly label: string;
  /** How many connectors stand here; shown in the ring when several steps are occupied. */
  readonly count?: number | undefined;
  /** 0 to 1, of a running bead. */
  readonly progress?: number | undefined;
}

export interface PlacedBead {
  readonly bead: Bead;
  readonly from: number;
  readonly to: number;
  readonly halfHeight: number;
  /** Where light has come to: `from` for nothing. */
  readonly litTo: number;
  readonly ring: { readonly x: number; readonly radius: number; readonly count: string | null } | null;
}

export interface FibreLineLayout {
  readonly jacketTo: number;
  readonly bufferTo: number;
  readonly ferruleFrom: number;
  readonly ferruleTo: number;
  readonly beads: readonly PlacedBead[];
  readonly labels: readonly (PlacedLabel<{ text: string; strong: boolean }> & { readonly leads: boolean })[];
}

export interface FibreLineRoom {
  readonly width: number;
  readonly labelSizePx: number;
  /** Stands after the label of a bead that is over: the colour alone must not say it. */
  readonly overWord: string;
}

const occupied: readonly BeadState[] = ['over', 'waiting', 'running', 'current'];
const isOccupied = ({ state }: Bead): boolean => occupied.includes(state);

/** Lays the beads between buffer and ferrule. Whatever the number of beads, nothing leaves the width or overlaps. */
export function layoutFibreLine(beads: readonly Bead[], room: FibreLineRoom): FibreLineLayout {
  const ends = room.width < 480 ? { jacket: 18, buffer: 13, ferrule: 32, clear: 5 } : wideEnds;
  const ferruleTo = Math.max(1, room.width - 1);
  const ferruleFrom = Math.max(0, ferruleTo - ends.ferrule);
  const from = Math.min(ferruleFrom, ends.jacket + ends.buffer + ends.clear);
  const to = Math.max(from, ferruleFrom - ends.clear);
  const several = beads.filter(isOccupied).length > 1;
  const widths = slotWidths(beads, to - from);
  let at = from;
  const placed = beads.map((bead, index) => {
    const slot = widths[index] ?? 0;
    const result = placeBead(bead, at, slot, several);
    at += slot;
    return result;
  });
  return {
    jacketTo: ends.jacket,
    bufferTo: ends.jacket + ends.buffer,
    ferruleFrom,
    ferruleTo,
    beads: placed,
    labels: layoutLabels(placed, several, room),
  };
}

const wideEnds = { jacket: 34, buffer: 28, ferrule: 60, clear: 12 };

/** Room for each bead in px; sums to `available` when there are beads. Timed ones are as long as their time says. */
function slotWidths(beads: readonly Bead[], available: number): number[] {
  const least = beads.map((bead) => (isOccupied(bead) ? 32 : bead.kind === 'timed' ? 26 : 15));
  const needed = sum(least);
  const extra = available - needed;
  if (extra <= 0) return least.map((width) => (width * available) / needed);
  const isTimed = (index: number): boolean => (beads[index]?.share ?? 0) > 0 && beads[index]?.kind === 'timed';
  const timedLeast = least.map((width, index) => (isTimed(index) ? width : 0));
  const stretch = (sum(timedLeast) > 0 ? extra * 0.4 : extra) / needed;
  const plain = least.map((width, index) => (isTimed(index) ? 0 : width * (1 + stretch)));
  const shares = beads.map((bead, index) => (isTimed(index) ? bead.share : 0));
  const timed = proportional(shares, timedLeast, available - sum(plain));
  return plain.map((width, index) => width + (timed[index] ?? 0));
}

/** Splits `total` by shares; whoever would get less than its least gets that, and the others share the rest. */
function proportional(shares: readonly number[], least: readonly number[], total: number): number[] {
  const short = new Set<number>();
  for (;;) {
    const left = total - sum(least.filter((_, index) => short.has(index)));
    const shareSum = sum(shares.filter((_, index) => !short.has(index)));
    const widths = shares.map((share, index) =>
      short.has(index) ? (least[index] ?? 0) : (left * share) / (shareSum || 1),
    );
    const fell = widths.findIndex((width, index) => !short.has(index) && width < (least[index] ?? 0));
    if (fell < 0) return widths;
    short.add(fell);
  }
}

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);

function placeBead(bead: Bead, slotFrom: number, slot: number, several: boolean): PlacedBead {
  const middle = slotFrom + slot / 2;
  const ringRadius = Math.min(16, slot / 2 - slot * 0.06);
  const ringAt = (x: number): PlacedBead['ring'] => {
    const count = several && bead.count !== undefined && ringRadius >= 13 ? String(bead.count) : null;
    return isOccupied(bead) ? { x, radius: ringRadius, count: (count?.length ?? 9) <= 2 ? count : null } : null;
  };
  if (bead.kind === 'step') {
    const radius = Math.min(8, slot * 0.36);
    const litTo = bead.state === 'done' ? middle + radius : middle - radius;
    return { bead, from: middle - radius, to: middle + radius, halfHeight: radius, litTo, ring: ringAt(middle) };
  }
  const clear = Math.min(3, slot * 0.08);
  const from = slotFrom + clear;
  const to = slotFrom + slot - clear;
  const travelled = { done: 1, 'to do': 0, current: 0, running: clamp(bead.progress ?? 0, 0, 1), waiting: 1, over: 1 };
  const litTo = from + (to - from) * travelled[bead.state];
  const ringX = clamp(litTo, slotFrom + ringRadius, slotFrom + slot - ringRadius);
  return { bead, from, to, halfHeight: Math.min(9, slot * 0.36), litTo, ring: ringAt(ringX) };
}

function layoutLabels(placed: readonly PlacedBead[], several: boolean, room: FibreLineRoom): FibreLineLayout['labels'] {
  const first = placed.findIndex(({ bead }) => isOccupied(bead));
  const lastDone = placed.findLastIndex(({ bead }, at) => bead.state === 'done' && (first < 0 || at < first));
  const next = placed.findIndex(({ bead }, at) => bead.state === 'to do' && at > first);
  const labels = placed.flatMap(({ bead, from, to, ring }, index) => {
    const strong = isOccupied(bead);
    if (!strong && index !== lastDone && index !== next) return [];
    const count = strong && several && bead.count !== undefined && ring?.count === null ? ` ${bead.count}` : '';
    const text = bead.label + count + (bead.state === 'over' ? `, ${room.overWord}` : '');
    const anchor = strong && ring !== null && bead.kind === 'step' ? ring.x : (from + to) / 2;
    const rank = strong ? occupied.indexOf(bead.state) : index === next ? occupied.length : occupied.length + 1;
    const width = textWidthPx(text, room.labelSizePx, strong ? 'bold' : 'regular');
    return [{ anchor, width, rank, payload: { text, strong } }];
  });
  const lowest = Math.min(...labels.map(({ rank }) => rank));
  const ranked = labels.map((label) => ({ ...label, rank: label.rank - lowest }));
  return placeLabels(ranked, { from: 0, to: room.width, gap: 12, farthest: 40 }).map((label) => ({
    ...label,
    leads: Math.abs(label.centre - label.anchor) > label.width / 2 - 4,
  }));
}

const clamp = (value: number, low: number, high: number): number => Math.max(low, Math.min(value, high));
