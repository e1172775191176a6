import { refuseOldNode } from './lib/node-version.mjs';
import { main, Refusal, say } from './lib/say.mjs';

/** Enough to see what is wrong, not so much that it hides the rest. */
const longestOutput = 300;

/** @param {string} output */
function shortened(output) {
  const lines = output.trim().split('\n');
  if (lines.length <= longestOutput) return lines.join('\n');
  const left = lines.length - longestOutput;
  return [...lines.slice(0, 20), `… ${left} lines left out …`, ...lines.slice(20 + left)].join('\n');
}

/**
 * @param {string} name
 * @param {import('./lib/schedule.mjs').Outcome} outcome
 * @param {number} seconds
 */
function tell(name, { passed, failed, skipped, output = '' }, seconds) {
  const counts = [
    passed > 1 && `${passed} passed`,
    failed > 1 && `${failed} failed`,
    skipped > 0 && `${skipped} skipped`,
  ];
  const more = counts.filter(Boolean).join(', ');
  say(`${failed > 0 ? 'FAIL' : 'ok  '}  ${name.padEnd(28)} ${seconds.toFixed(1).padStart(6)} s  ${more}`.trimEnd());
  if (failed > 0) say(shortened(output));
}

// Only what Node brings may be imported before the packages are installed.
await main(async () => {
  refuseOldNode();
  const args = process.argv.slice(2);
  const wrong = args.find((each) => each !== '--fast');
  if (wrong !== undefined) throw new Refusal(`npm test knows --fast and no ${wrong}.`, 2);

  const { ensureInstalled } = await import('./lib/install.mjs');
  await ensureInstalled();
  const { stagesOf } = await import('./lib/stages.mjs');
  const { runStages } = await import('./lib/schedule.mjs');
  const now = () => performance.now();
  const began = now();
  const outcomes = [
    ...(await runStages(stagesOf({ fast: args.includes('--fast') }), { width: 2, now, told: tell })).values(),
  ];
  const passed = outcomes.reduce((sum, each) => sum + each.passed, 0);
  const failed = outcomes.reduce((sum, each) => sum + each.failed, 0);
  say(`${Math.round((now() - began) / 1000)} s in all`);
  say(`${passed} passed, ${failed} failed`);
  return failed > 0 ? 1 : 0;
});
