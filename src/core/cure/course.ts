/** How temperature runs within a segment. Temperatures in °C. */
export type Shape =
  | { readonly kind: 'constant'; readonly temperatureC: number }
  /** From the segment's start to its end, which must be finite. */
  | { readonly kind: 'linear'; readonly startC: number; readonly endC: number }
  /** First order toward a temperature, with a time constant in ms (63 % of the way after one). */
  | { readonly kind: 'lag'; readonly startC: number; readonly towardC: number; readonly constantMs: number };

/** From `fromMs` up to but without `toMs`; only a constant may begin at -Infinity, only a linear must end. */
export interface Segment {
  readonly fromMs: number;
  readonly toMs: number;
  readonly shape: Shape;
}

/** Segments in order, each beginning where the one before ends. Milliseconds count from a zero that the maker names. */
export type Course = readonly Segment[];

/** Temperature (°C) of a segment at a time (ms); at its very end the value that it ends with. */
export function segmentTemperatureC({ fromMs, toMs, shape }: Segment, ms: number): number {
  switch (shape.kind) {
    case 'constant':
      return shape.temperatureC;
    case 'linear':
      return shape.startC + ((shape.endC - shape.startC) * (ms - fromMs)) / (toMs - fromMs);
    case 'lag':
      return shape.towardC + (shape.startC - shape.towardC) * Math.exp((fromMs - ms) / shape.constantMs);
  }
}

/** When (ms) a segment passes a temperature (°C) strictly between its ends; null when it does not. */
export function passesAtMs({ fromMs, toMs, shape }: Segment, temperatureC: number): number | null {
  const ms = lineMs(fromMs, toMs, shape, temperatureC);
  return ms > fromMs && ms < toMs ? ms : null;
}

function lineMs(fromMs: number, toMs: number, shape: Shape, temperatureC: number): number {
  if (shape.kind === 'constant') return NaN;
  if (shape.kind === 'linear') {
    return fromMs + ((temperatureC - shape.startC) / (shape.endC - shape.startC)) * (toMs - fromMs);
  }
  return fromMs + shape.constantMs * Math.log((shape.startC - shape.towardC) / (temperatureC - shape.towardC));
}

export function segmentAt<Kind extends Segment>(course: readonly Kind[], ms: number): Kind | null {
  return course.find((segment) => segment.fromMs <= ms && ms < segment.toMs) ?? null;
}

/** Temperature (°C) at a time (ms); null outside the course. */
export function temperatureAtC(course: Course, ms: number): number | null {
  const segment = segmentAt(course, ms);
  return segment ? segmentTemperatureC(segment, ms) : null;
}

/** Coldest and hottest temperature (°C) from one time to another (ms), both included; null where none is known. */
export function extremesC(course: Course, fromMs: number, toMs: number): { coldestC: number; hottestC: number } | null {
  // Every shape only rises or only falls, so the ends of its part tell.
  const ends = course
    .filter((segment) => segment.fromMs <= toMs && segment.toMs > fromMs)
    .flatMap((segment) => [
      segmentTemperatureC(segment, Math.max(segment.fromMs, fromMs)),
      segmentTemperatureC(segment, Math.min(segment.toMs, toMs)),
    ]);
  return ends.length === 0 ? null : { coldestC: Math.min(...ends), hottestC: Math.max(...ends) };
}
