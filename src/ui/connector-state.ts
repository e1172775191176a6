/** How one connector is shown at a step. */
export type ConnectorState =
  'to do' | 'current' | 'done' | 'passed' | 'sent back' | 'scrapped' | 'left out' | 'in load' | 'elsewhere';

/** One connector as the rows and grids take it; `word` is its state in the language of the page. */
export interface ConnectorMark {
  readonly number: number;
  readonly state: ConnectorState;
  readonly word: string;
}

export interface FaceLook {
  readonly hue: string;
  readonly ringPx: number;
  readonly dashed: boolean;
  readonly cladding: 'surface' | 'glass' | 'hue' | 'none';
  readonly core: 'hue' | 'surface' | 'none';
  /** Path in a 14 by 14 box, stroked. */
  readonly sign: string | null;
}

const signs = {
  tick: 'M2 7.5L5.5 11.5L12 3',
  twoTicks: 'M1 8L3.5 11L8 4M7 11L12.5 4',
  back: 'M12 11V8A3 3 0 0 0 9 5H2M5.5 1.5L2 5L5.5 8.5',
  cross: 'M2.5 2.5L11.5 11.5M11.5 2.5L2.5 11.5',
  minus: 'M2 7H12',
  tray: 'M1.5 5V11.5H12.5V5M5 3V7.5M9 3V7.5',
  dots: 'M2.5 7H2.6M7 7H7.1M11.5 7H11.6',
};

const look = (part: Partial<FaceLook>): FaceLook => ({
  hue: 'var(--ink)',
  ringPx: 2,
  dashed: false,
  cladding: 'surface',
  core: 'hue',
  sign: null,
  ...part,
});

/** Every state differs in shape and sign, so that its hue may be lost. */
export const faceLooks: Readonly<Record<ConnectorState, FaceLook>> = {
  'to do': look({}),
  current: look({ hue: 'var(--running)', ringPx: 6 }),
  done: look({ hue: 'var(--done)', cladding: 'glass', sign: signs.tick }),
  passed: look({ hue: 'var(--done)', ringPx: 3, cladding: 'hue', core: 'surface', sign: signs.twoTicks }),
  'sent back': look({ hue: 'var(--soon)', ringPx: 3, cladding: 'none', sign: signs.back }),
  scrapped: look({ hue: 'var(--over)', ringPx: 3, cladding: 'none', core: 'none', sign: signs.cross }),
  'left out': look({ hue: 'var(--soft)', dashed: true, cladding: 'none', core: 'none', sign: signs.minus }),
  'in load': look({ hue: 'var(--running)', ringPx: 3, cladding: 'glass', sign: signs.tray }),
  elsewhere: look({ hue: 'var(--soft)', cladding: 'none', sign: signs.dots }),
};

export interface MarkGroup {
  readonly from: number;
  readonly to: number;
  readonly marks: readonly ConnectorMark[];
}

/** A big batch in groups of ten, so that each group is still a target for a glove. */
export function groupsOfTen(marks: readonly ConnectorMark[]): MarkGroup[] {
  const groups: MarkGroup[] = [];
  for (let at = 0; at < marks.length; at += 10) {
    const part = marks.slice(at, at + 10);
    groups.push({ from: part[0]?.number ?? 0, to: part.at(-1)?.number ?? 0, marks: part });
  }
  return groups;
}

/** How many connectors there are in each state, in the order of first appearance. */
export function countStates(marks: readonly ConnectorMark[]): { state: ConnectorState; word: string; count: number }[] {
  const counts = new Map<ConnectorState, { state: ConnectorState; word: string; count: number }>();
  for (const { state, word } of marks) {
    const entry = counts.get(state) ?? { state, word, count: 0 };
    counts.set(state, { ...entry, count: entry.count + 1 });
  }
  return [...counts.values()];
}
