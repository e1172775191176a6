import type { ReviewedClock } from '../../core/review/lateness.ts';

export const shift = {
  title: 'Shift',
  choose: 'Which shift',
  this: 'This shift',
  between: 'Between shifts',
  day: 'Whole day',
  hours: (date: string, from: string, to: string) => `${date}, ${from} to ${to}`,
  soFar: 'so far',
  reading: 'Reading the records.',
  unread: 'The records cannot be read now. Load the page again.',
  print: 'Print',
  printed: (date: string, time: string) => `Printed ${date}, ${time}`,
  none: '-',
  sentence: {
    nothing: (inWork: number) => (inWork === 0 ? 'Nothing finished.' : `Nothing finished; ${inWork} in work.`),
    firstPass: (count: number, of: number, percent: number, low: number, high: number) =>
      `${count} of ${of} right first time (${percent} %, ${low} to ${high})`,
    scrapped: (count: number) => (count === 0 ? 'none scrapped' : `${count} scrapped`),
    mostSentBack: (defect: string, count: number) => `most sent back: ${defect}, ${count}`,
    noneSentBack: 'nothing sent back',
  },
  figure: {
    passed: 'Passed',
    firstPass: 'Right first time',
    scrapped: 'Scrapped',
    inWork: 'In work',
  },
  of: (count: number, of: number, what: string) => `${count} of ${of} ${what}`,
  ofFinished: 'finished',
  ofHandled: 'that were in work',
  interval: (low: number, high: number) => `95 % sure: ${low} to ${high} %`,
  carried: (carriedIn: number, started: number) => `${carriedIn} carried in, ${started} started`,
  formula: 'How it is reckoned',
  formulas: {
    passed:
      'Connectors that passed the last step within these hours, of those in work as they began and those begun since.',
    firstPass:
      'First-pass yield: connectors that passed at attempt 1 with nothing sent back, divided by connectors passed or scrapped within these hours. A new attempt at the same position is the same connector. The interval is Wilson’s, 95 %.',
    scrapped: 'Scrap ratio: connectors scrapped, divided by connectors passed or scrapped within these hours.',
    inWork: 'Carried in and started, less passed and scrapped. For hours that are over: as they ended.',
    cycle:
      'From the opening of the batch until the connector passed, all attempts together. Cure: in the oven or cooling down, measured. Hands-on: the time since the same person’s previous entry on this tablet, at most three times the standard; it is an estimate. Waiting: the rest. Median and 90th percentile are R’s type 7; those of the parts need not add up, the averages do.',
    lateness:
      'Of each clock that somebody ended: how long after it was due, and how long its alarm called before somebody said “seen”. Before it was due is early.',
  },
  byRecipe: {
    title: 'By recipe',
    none: 'No batch was worked on.',
    recipe: 'Recipe',
    revision: (name: string, revision: string) => `${name}, rev ${revision}`,
    cycle: 'Median cycle',
  },
  cycle: {
    title: 'Cycle time',
    sentence: (connectors: number, median: string, ninetieth: string) =>
      `Of the ${connectors} that passed, half took ${median} or less, 9 of 10 took ${ninetieth} or less.`,
    bar: (connectors: number) => `Average of ${connectors}, split into hands-on, cure and waiting`,
    average: 'Average of each connector:',
    handsOn: 'hands-on (estimate)',
    cure: 'cure and cool-down',
    waiting: 'waiting',
    total: 'whole cycle',
    part: 'Part',
    median: 'Median',
    ninetieth: '90th percentile',
    none: 'Nothing passed, so there is no cycle time.',
    estimate: 'Hands-on time is an estimate.',
    acrossClocks: (count: number) => `${count} of them rest on two tablets’ clocks.`,
  },
  lateness: {
    title: 'Clocks',
    sentence: (count: number, over: number, early: number) =>
      `${count} ended; ${over === 0 ? 'none' : over} past the limit, ${early === 0 ? 'none' : early} too early.`,
    none: 'No clock ended.',
    clock: (kind: ReviewedClock['kind'], step: string, station: string) =>
      kind === 'working life' ? `Working life, ${step}` : station === '' ? step : `${step}, ${station}`,
    connectors: (count: number) => (count === 1 ? '1 connector' : `${count} connectors`),
    onTime: 'on time',
    late: (span: string) => `${span} after it was due`,
    early: (span: string) => `${span} too early`,
    over: (span: string) => `past its limit, ${span} after it was due`,
    overrun: (span: string) => `used ${span} after it was over`,
    seen: (span: string) => `alarm seen after ${span}`,
    seenAtOnce: 'alarm seen at once',
    reason: (reason: string) => `Reason: ${reason}`,
  },
  causes: {
    sentBack: 'Sent back, and why',
    scrapped: 'Scrapped, and why',
    sentence: (count: number, cause: string) => `${count} in all; most for: ${cause}.`,
    noneSentBack: 'Nothing was sent back.',
    noneScrapped: 'Nothing was scrapped.',
  },
};
