import { from, type Script } from '../fake/script.ts';

/** A batch of the small recipe, filled and ready for the oven. */
export const filled = (script: Script, batch: string, count: number): Script =>
  script
    .open(batch, count)
    .do({ type: 'finish step', batch, step: 'strip', connectors: from(1, count) })
    .do({ type: 'mix adhesive', batch, connectors: from(1, count), mix: `mix-${batch}`, lot: 'A-1', roomC: 23 })
    .do({ type: 'finish step', batch, step: 'fill', connectors: from(1, count) });

/** The same, cured for its 20 minutes and cooled. */
export const cooled = (script: Script, batch: string, count: number): Script =>
  filled(script, batch, count)
    .do({ type: 'start load', batch, step: 'cure', load: `oven-${batch}`, station: '', connectors: from(1, count) })
    .wait(1200)
    .do({ type: 'end load', batch, load: `oven-${batch}`, nextLoad: `cool-${batch}` })
    .wait(600)
    .do({ type: 'end load', batch, load: `cool-${batch}`, nextLoad: 'none' });
