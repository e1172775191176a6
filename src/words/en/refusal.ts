import type { Refusal, RefusalCode, TextField } from '../../core/command/refusal.ts';
import { numberList, span } from '../format.ts';

type Sentence<Code extends RefusalCode> = (refusal: Extract<Refusal, { code: Code }>) => string;

const field: Readonly<Record<TextField, string>> = {
  'work order': 'work order',
  lot: 'lot',
  reason: 'reason',
  'tablet name': 'tablet’s name',
  'oven name': 'oven’s name',
  'shift name': 'shift’s name',
  serial: 'serial number',
};

/** One sentence for every refusal: what is wrong, and what would be right. */
export const refusal: { readonly [Code in RefusalCode]: Sentence<Code> } = {
  'batch unknown': () => 'This batch is not on this tablet.',
  'batch exists': () => 'This batch is open already.',
  'batch is closed': () => 'This batch is closed. Open it again first.',
  'batch is open': () => 'This batch is open.',
  'batch is held': ({ reason }) => `This batch is on hold: ${reason}.`,
  'batch is not held': () => 'This batch is not on hold.',
  'connectors out of range': ({ found, most }) => `A batch has 1 to ${most} connectors, not ${found}.`,
  'no connectors': () => 'No connector is chosen.',
  'no such connector': ({ number }) => `There is no connector ${number} in this batch.`,
  'not at this step': ({ numbers }) => `${numberList(numbers)} is not at this step.`,
  'already finished': ({ numbers }) => `${numberList(numbers)} is finished already.`,
  'work order empty': () => 'Enter the work order.',
  'text too long': (refused) =>
    `The ${field[refused.field]} has ${refused.length} characters; at most ${refused.most} fit.`,
  'text missing': (refused) => `Enter the ${field[refused.field]}.`,
  'serial twice': ({ serial }) => `Serial ${serial} stands there twice.`,
  'tag taken': ({ tag }) => `Tag ${tag} is on another open batch.`,
  'no tag free': () => 'All twelve tags are on open batches. Close one first.',
  'recipe not usable': ({ problems }) => `The recipe has a mistake: ${problems[0]?.sentence ?? ''}`,
  'no such step': ({ step }) => `The recipe has no step ${step}.`,
  'step needs a load': () => 'This step is started and ended.',
  'step needs a judgement': () => 'This step ends in good or not good.',
  'step needs a mix': () => 'This step needs a mix.',
  'step is not a mix': () => 'No adhesive is mixed at this step.',
  'step is not a load': () => 'This step is not started and ended.',
  'step is not judged': () => 'Nothing is judged at this step.',
  'load too large': ({ found, most }) => `A load holds ${most}; ${found} are chosen.`,
  'one at a time': () => 'This step goes one by one.',
  'no such load': () => 'This load is not here.',
  'load ended': () => 'This load has ended already.',
  'time unknown': () =>
    'First say how long the tablet was off: until then nobody knows whether the adhesive is still good.',
  'mix unknown': () => 'This mix is not here.',
  'mix is of another adhesive': ({ mixed, wanted }) => `The mix is ${mixed}; the recipe wants ${wanted}.`,
  'mix is over': ({ sinceS }) => `This mix has been past its working life for ${span(sinceS * 1000)}. Mix anew.`,
  'working life over': ({ lateS }) => `The working life has been over for ${span(lateS * 1000)}. Say why, or mix anew.`,
  'too early': ({ leftS }) =>
    leftS === null ? 'It is not done. Say why.' : `${span(leftS * 1000)} too early. Say why.`,
  'too late': ({ lateS }) => `${span(lateS * 1000)} past its time. Say why.`,
  'target not earlier': () => 'A connector goes back to an earlier step only.',
  'defect unknown': ({ defect }) => `The recipe does not know the finding ${defect}.`,
  'crack is not polished out': () => 'A crack is never polished out. Cut it off or scrap it.',
  'repolish limit': ({ numbers, most }) =>
    `${numberList(numbers)} was sent back ${most} times, the most that the recipe allows. Cut it off or scrap it.`,
  'connectors unfinished': ({ count }) => `${count} still unfinished. Pass or scrap each, or end the batch short.`,
  'ago out of range': ({ mostS }) => `At most ${span(mostS * 1000)} ago.`,
  'ago needs a reason': () => 'Past two minutes an entry says why it is late.',
  'earlier than what it follows': () => 'That is before what went before it.',
  'nothing to undo': () => 'There is nothing to undo.',
  'entry unknown': () => 'This entry is not here or was taken back already.',
  'cannot take back a taking back': () => 'Taking back cannot be taken back. Enter it again.',
  'others rest on it': ({ resting }) => `${resting.length} later entries rest on it.`,
  'mix in use': ({ batches }) => `${batches.length} batches took this mix.`,
  'oven unknown': () => 'This oven is not here.',
  'temperature out of range': ({ found, lowest, highest }) =>
    `${found} °C cannot be right here: ${lowest} to ${highest} °C.`,
  'warm-up out of range': ({ mostS }) => `The warm-up is 0 to ${mostS / 60} min.`,
  'too many': ({ what, most }) => `At most ${most} ${what}.`,
  'initials unfit': ({ found }) => `“${found}”: initials are 1 to 4 letters or digits, a letter first.`,
  'initials twice': ({ found }) => `${found} stands there twice.`,
  'operator unknown': ({ operator }) => `${operator} is not among the operators in Settings.`,
  'shift time unfit': ({ shift, found }) => `${shift}: “${found}” is no time of day like 06:00.`,
  'time out of range': ({ mostS }) => `0 to ${mostS / 86_400} days.`,
  'does not fit': ({ why }) => `This does not fit: ${why}.`,
};
