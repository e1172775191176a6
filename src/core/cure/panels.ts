import { passesAtMs, segmentTemperatureC, type Course, type Segment, type Shape } from './course.ts';
import type { DoseLaw } from './dose-law.ts';

/** A stretch of a course on which the law is smooth: what one quadrature takes. Times in ms. */
export interface Panel {
  readonly fromMs: number;
  readonly toMs: number;
  readonly segment: Segment;
}

/** Widest change of temperature within one panel: keeps eight nodes at rounding error for a hundredfold rate per 20 °C. */
const panelStepC = 10;
/** After so many time constants a lag is its target to the last bit of a double. */
const lagEndsAfter = 40;

/**
 * A course cut where the law bends and in steps of temperature and time. The cuts do not depend on what is asked of
 * them, so dose is summed alike for every time and cannot fall from one time to a later one.
 */
export function* panels(course: Course, law: DoseLaw): Generator<Panel> {
  for (const segment of course) {
    if (segment.shape.kind === 'constant') {
      yield { ...bounds(segment), segment };
      continue;
    }
    const settled = settledMs(segment);
    const curved = { ...segment, toMs: settled };
    let fromMs = segment.fromMs;
    for (const toMs of [...cuts(curved, law.breaksC), settled]) {
      if (toMs > fromMs) yield { fromMs, toMs, segment: curved };
      fromMs = toMs;
    }
    if (segment.shape.kind === 'lag' && settled < segment.toMs) {
      const shape: Shape = { kind: 'constant', temperatureC: segment.shape.towardC };
      yield { fromMs: settled, toMs: segment.toMs, segment: { fromMs: settled, toMs: segment.toMs, shape } };
    }
  }
}

const bounds = ({ fromMs, toMs }: Segment) => ({ fromMs, toMs });

function settledMs({ fromMs, toMs, shape }: Segment): number {
  return shape.kind === 'lag' ? Math.min(toMs, fromMs + lagEndsAfter * shape.constantMs) : toMs;
}

function cuts(segment: Segment, breaksC: readonly number[]): number[] {
  const startC = segmentTemperatureC(segment, segment.fromMs);
  const endC = segmentTemperatureC(segment, segment.toMs);
  const steps = Math.floor(Math.abs(endC - startC) / panelStepC);
  const gridC = Array.from({ length: steps }, (_, step) => startC + Math.sign(endC - startC) * panelStepC * (step + 1));
  const passed = [...breaksC, ...gridC].flatMap((temperatureC) => passesAtMs(segment, temperatureC) ?? []);
  return [...passed, ...lagCuts(segment)].sort((a, b) => a - b);
}

function lagCuts({ fromMs, toMs, shape }: Segment): number[] {
  if (shape.kind !== 'lag') return [];
  const whole = Math.ceil((toMs - fromMs) / shape.constantMs) - 1;
  return Array.from({ length: Math.max(0, whole) }, (_, step) => fromMs + shape.constantMs * (step + 1));
}
