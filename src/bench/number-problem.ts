import type { NumberProblem } from '../ui/parse-number.ts';
import type { Words } from '../words/index.ts';

/** The sentence for what is wrong with a typed number. */
export function numberProblem(words: Words, problem: NumberProblem): string {
  const say = words.number;
  switch (problem.code) {
    case 'empty':
      return say.empty(problem.unit);
    case 'not a number':
      return say.notANumber(problem.typed.slice(0, 20), problem.unit);
    case 'thousands sign':
      return say.thousandsSign(problem.typed.slice(0, 20));
    case 'too many decimals':
      return say.tooManyDecimals(problem.decimals);
    case 'too low':
      return say.tooLow(problem.lowest, problem.unit);
    case 'too high':
      return say.tooHigh(problem.highest, problem.unit);
  }
}
