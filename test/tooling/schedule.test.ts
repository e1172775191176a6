import { expect, test } from 'vitest';
import { runStages } from '../../.ci/lib/schedule.mjs';

const passed = { passed: 1, failed: 0, skipped: 0 };
const failed = { passed: 0, failed: 1, skipped: 0 };

/** Stages that note when they begin and end, and how many ran at once. */
function notebook() {
  const notes: string[] = [];
  let at = 0;
  let most = 0;
  const stage = (name: string, outcome = passed, order: { after?: string[]; needs?: string[] } = {}) => ({
    name,
    ...order,
    run: async () => {
      most = Math.max(most, ++at);
      notes.push(`${name} begins`);
      await new Promise((done) => setTimeout(done, 5));
      notes.push(`${name} ends`);
      at--;
      return outcome;
    },
  });
  return { notes, stage, most: () => most };
}

const how = { width: 2, now: () => 0, told: () => undefined };

test('two at a time, each after what it waits for', async () => {
  const { notes, stage, most } = notebook();
  const stages = [
    stage('a'),
    stage('b'),
    stage('c', passed, { needs: ['a'] }),
    stage('d', passed, { after: ['a', 'b', 'c'] }),
  ];
  await runStages(stages, how);
  expect(most()).toBe(2);
  expect(notes.indexOf('c begins')).toBeGreaterThan(notes.indexOf('a ends'));
  expect(notes.slice(-2)).toEqual(['d begins', 'd ends']);
});

test('what needs a failed stage is not run and counts as a failure; what only follows it runs', async () => {
  const { notes, stage } = notebook();
  const ended = await runStages(
    [stage('a', failed), stage('b', passed, { needs: ['a'] }), stage('c', passed, { after: ['a'] })],
    how,
  );
  expect(notes).not.toContain('b begins');
  expect(ended.get('b')).toMatchObject({ failed: 1, output: 'Not run, because a failed.' });
  expect(ended.get('c')).toBe(passed);
});

test('a stage that throws is a failure with its sentence', async () => {
  const ended = await runStages([{ name: 'a', run: () => Promise.reject(new Error('No browser.')) }], how);
  expect(ended.get('a')).toMatchObject({ failed: 1, output: 'No browser.' });
});

test('stages that wait for one another are told, not waited for', async () => {
  const { stage } = notebook();
  const ring = [stage('a', passed, { after: ['b'] }), stage('b', passed, { after: ['a'] })];
  await expect(runStages(ring, how)).rejects.toThrow('a, b');
});
