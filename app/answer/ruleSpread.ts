import {
  propertyDefinition,
  type RuleSpread,
  VI_DEFINITION,
  VISCOSITY_RULE_TABLE,
  type ViscosityRule,
} from '../../src';
import { figureText } from '../stocks/figureText';

/** Far too thick for unlike stocks by its nature: shown, but no measure of doubt. */
const OUTSIDER = 'cube root';

function definitionOf({ property }: RuleSpread) {
  return property === 'vi' ? VI_DEFINITION : (propertyDefinition('kv') ?? VI_DEFINITION);
}

export function ruleLabel(rule: string): string {
  return VISCOSITY_RULE_TABLE[rule as ViscosityRule]?.label ?? rule;
}

export function spreadText(spread: RuleSpread, rule: string): string {
  return figureText(definitionOf(spread), spread.byRule.find((entry) => entry.rule === rule)?.value);
}

/** "13.2 to 19.9": what the other rules say of a property; undefined where none can be applied. */
export function otherRules(spread: RuleSpread, ownRule: string): string | undefined {
  const values = spread.byRule
    .filter(({ rule }) => rule !== ownRule && rule !== OUTSIDER)
    .flatMap(({ value }) => value ?? []);
  if (values.length === 0) return undefined;
  const text = (value: number) => figureText(definitionOf(spread), value);
  const [least, most] = [text(Math.min(...values)), text(Math.max(...values))];
  return least === most ? least : `${least} to ${most}`;
}
