/** A label that wants to stand centred at `anchor` px. */
export interface Label<Payload> {
  readonly anchor: number;
  readonly width: number;
  /** Lower is kept longer when there is no room for all. */
  readonly rank: number;
  readonly payload: Payload;
}

export interface PlacedLabel<Payload> extends Label<Payload> {
  readonly centre: number;
}

export interface LabelRoom {
  readonly from: number;
  readonly to: number;
  readonly gap: number;
  /** How far a label may end beside its anchor before it misleads. */
  readonly farthest: number;
}

/**
 * Sets labels in one line without any two touching, each as near to its anchor as the others allow. Those that have no
 * room are left out, highest rank first. Labels must come in the order of their anchors.
 */
export function placeLabels<Payload>(labels: readonly Label<Payload>[], room: LabelRoom): PlacedLabel<Payload>[] {
  const placed = shiftApart(labels, room);
  const needed = labels.reduce((sum, { width }) => sum + width, 0) + room.gap * Math.max(0, labels.length - 1);
  const fits = needed <= room.to - room.from;
  const strays = placed.filter(({ centre, anchor, width }) => Math.abs(centre - anchor) > width / 2 + room.farthest);
  if (labels.length === 0 || (fits && strays.length === 0)) return placed;
  const highest = Math.max(...labels.map(({ rank }) => rank));
  const victim = labels.findLastIndex(({ rank }) => rank === highest);
  return placeLabels(
    labels.filter((_, index) => index !== victim),
    room,
  );
}

/**
 * Least weighted squares under "next starts after previous ends" (pool adjacent violators): with each label's
 * minimal offset taken off, the centres need only not fall.
 */
function shiftApart<Payload>(labels: readonly Label<Payload>[], room: LabelRoom): PlacedLabel<Payload>[] {
  const offsets: number[] = [];
  labels.forEach(({ width }, index) => {
    const before = labels[index - 1];
    offsets.push(before === undefined ? 0 : (offsets[index - 1] ?? 0) + (before.width + width) / 2 + room.gap);
  });
  const blocks: { weight: number; mean: number; size: number }[] = [];
  labels.forEach(({ anchor, rank }, index) => {
    let block = { weight: rank === 0 ? 12 : 1, mean: anchor - (offsets[index] ?? 0), size: 1 };
    for (let last = blocks.at(-1); last !== undefined && last.mean > block.mean; last = blocks.at(-1)) {
      blocks.pop();
      const weight = last.weight + block.weight;
      block = {
        weight,
        mean: (last.mean * last.weight + block.mean * block.weight) / weight,
        size: last.size + block.size,
      };
    }
    blocks.push(block);
  });
  const low = room.from + (labels[0]?.width ?? 0) / 2;
  const high = room.to - (labels.at(-1)?.width ?? 0) / 2 - (offsets.at(-1) ?? 0);
  const bases = blocks.flatMap(({ mean, size }) => new Array<number>(size).fill(Math.max(low, Math.min(mean, high))));
  return labels.map((label, index) => ({ ...label, centre: (bases[index] ?? 0) + (offsets[index] ?? 0) }));
}
