import { pointer, type Problem, type Rule } from '../problem.ts';

/** A load has a size exactly where a step goes load by load. */
export const loadRule: Rule = ({ steps }) =>
  steps.flatMap(({ id, goes, loadSize }, index): Problem[] => {
    const path = pointer('steps', index, 'loadSize');
    if (goes === 'load by load' && loadSize === undefined) {
      const sentence = `"${id}" goes load by load and must say how many a load holds.`;
      return [{ path, code: 'load-size-missing', expected: 'a number of connectors', found: 'nothing', sentence }];
    }
    if (goes !== 'load by load' && loadSize !== undefined) {
      const sentence = `"${id}" goes ${goes}, so it has no load size.`;
      return [{ path, code: 'load-size-unexpected', expected: 'nothing', found: `${loadSize}`, sentence }];
    }
    return [];
  });
