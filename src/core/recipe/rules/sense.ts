import type { Problem, Rule } from '../problem.ts';
import type { Recipe } from '../schema.ts';
import { adhesiveRangeRule, computedPairRule, coolDownRule, curePairRule, setPointRule } from './adhesive.ts';
import { angleCheckRule, angleRule } from './angle.ts';
import { basisCoverRule, basisRule } from './basis.ts';
import { cautionRule } from './caution.ts';
import { lastStepRule, readingRule } from './check.ts';
import { boreRule, coreRule, layerRule } from './fibre.ts';
import { filmRule, gritRule } from './film.ts';
import { identifierRule } from './identifier.ts';
import { loadRule } from './load.ts';
import { mixLimitRule, workingLifeRule } from './mix.ts';
import { crackRule, reworkDefectRule, reworkMixRule, reworkTargetRule } from './rework.ts';
import { reterminationRule, stripNestingRule, stripReachRule, stripToleranceRule } from './strip.ts';

const rules: readonly Rule[] = [
  identifierRule,
  coreRule,
  layerRule,
  boreRule,
  stripToleranceRule,
  stripNestingRule,
  stripReachRule,
  reterminationRule,
  adhesiveRangeRule,
  curePairRule,
  computedPairRule,
  setPointRule,
  coolDownRule,
  mixLimitRule,
  workingLifeRule,
  gritRule,
  filmRule,
  angleRule,
  angleCheckRule,
  reworkDefectRule,
  reworkTargetRule,
  crackRule,
  reworkMixRule,
  loadRule,
  cautionRule,
  readingRule,
  lastStepRule,
  basisRule,
  basisCoverRule,
];

/** All that is wrong with what a recipe means; its shape must be right. */
export function senseProblems(recipe: Recipe): Problem[] {
  return rules.flatMap((rule) => rule(recipe));
}
