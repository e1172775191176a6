import { pointer, type Problem, type Rule } from '../problem.ts';

/** An angle belongs to APC and to nothing else. */
export const angleRule: Rule = ({ fits: { polish, angleDeg } }) => {
  const path = '/fits/angleDeg';
  const found = `${angleDeg}°`;
  if (polish === 'APC' && angleDeg === 0) {
    const sentence = 'An APC recipe must have its angle.';
    return [{ path, code: 'angle-missing', expected: 'more than 0°', found, sentence }];
  }
  if (polish !== 'APC' && angleDeg !== 0) {
    const sentence = `A ${polish} end face has no angle, but ${found} stood there.`;
    return [{ path, code: 'angle-unexpected', expected: '0°', found, sentence }];
  }
  return [];
};

/** After its last film an APC recipe measures the angle, against limits on both sides of it. */
export const angleCheckRule: Rule = ({ fits: { polish, angleDeg }, steps }) => {
  if (polish !== 'APC') return [];
  const lastFilm = steps.findLastIndex((step) => step.kind === 'polish');
  const readings = steps.flatMap((step, index) =>
    step.kind === 'measure' && index > lastFilm
      ? step.readings.flatMap((reading, position) =>
          reading.quantity === 'polish angle' ? [{ reading, path: pointer('steps', index, 'readings', position) }] : [],
        )
      : [],
  );
  if (readings.length === 0) {
    return [
      {
        path: '/steps',
        code: 'angle-unchecked',
        expected: 'a measure step with a reading of "polish angle" after the last film',
        found: 'none',
        sentence: 'An APC recipe must end in a check of its angle.',
      },
    ];
  }
  return readings.flatMap(({ reading: { lowest, highest }, path }): Problem[] => {
    if (lowest !== undefined && highest !== undefined && lowest <= angleDeg && angleDeg <= highest) return [];
    const found = `${lowest ?? 'no lowest'} to ${highest ?? 'no highest'}`;
    const sentence = `The limits of the angle, ${found}, must lie on both sides of ${angleDeg}°.`;
    return [{ path, code: 'angle-limits', expected: `limits on both sides of ${angleDeg}°`, found, sentence }];
  });
};
