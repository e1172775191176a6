/** Grains of a film on a square sheet in px, to scale with one another: even, without chance, and never on an edge. */
export interface Grains {
  readonly radius: number;
  readonly at: readonly { readonly x: number; readonly y: number }[];
}

/** Under this a grain cannot be seen and is drawn as a dot of this size. */
const smallestPx = 0.7;

/** `largestUm` is the coarsest film of the recipe; its grains get a fifth of the sheet. */
export function filmGrains(filmUm: number, largestUm: number, sidePx: number): Grains {
  const radius = Math.max(smallestPx, (filmUm / largestUm) * sidePx * 0.1);
  const pitch = Math.max(radius * 2.6, 5);
  const rows = Math.max(1, Math.floor((sidePx - 6 - radius) / pitch));
  const start = (sidePx - (rows - 1) * pitch) / 2;
  const at: { x: number; y: number }[] = [];
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < rows - (row % 2); column++) {
      at.push({ x: start + column * pitch + (row % 2) * (pitch / 2), y: start + row * pitch });
    }
  }
  return { radius, at };
}
