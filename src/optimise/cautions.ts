import type { PredictedProperties } from '../blend/predictedProperties';
import { reproducibilityOf } from '../property/propertyDefinition';
import { propertyDefinition } from '../property/propertyTable';
import { VISCOSITY_RULE_TABLE, type ViscosityRule } from '../property/viscosityRule';
import { findFigure } from '../stock/findFigure';
import type { Recipe, Stock } from '../stock/stock';
import { limitInWords } from './checkLimits';
import type { Limit, Order } from './order';
import type { Caution, LimitCheck } from './outcome';

/** The cube-root rule is far off for unlike stocks by its nature: its disagreement tells nothing. */
const RULES_THAT_COUNT = new Set(['wright', 'walther', 'refutas', 'logarithmic']);
/** R of a viscosity index that follows from those of KV40 and KV100 [-]; from memory, 2.6 to 7 for a PAO 6. */
const VI_REPRODUCIBILITY = 3;

function reproducibility({ property, celsius, value }: LimitCheck): number {
  if (property === 'vi') return VI_REPRODUCIBILITY;
  const definition = propertyDefinition(property);
  return (definition && reproducibilityOf(definition, value, celsius)) ?? 0;
}

const LIST = new Intl.ListFormat('en-GB');

/** Beyond so many reproducibilities the rules disagree about the mix, not about a mix that sits on its limit. */
const WIDE_DISAGREEMENT = 2;

/** Rules that put the mix outside a limit, and by how many reproducibilities of the method. */
function disagreeing(check: LimitCheck, predicted: PredictedProperties): { rule: ViscosityRule; times: number }[] {
  const spread = predicted.spread.find((entry) => entry.property === check.property && entry.celsius === check.celsius);
  const slack = reproducibility(check);
  return (spread?.byRule ?? []).flatMap(({ rule, value }) => {
    if (value === undefined || !RULES_THAT_COUNT.has(rule)) return [];
    const outside = Math.max((check.min ?? -Infinity) - value, value - (check.max ?? Infinity));
    return outside > slack ? [{ rule: rule as ViscosityRule, times: outside / slack }] : [];
  });
}

/**
 * Where another rule puts the mix outside a limit: prominent where it does so by far, quiet where the mix merely sits
 * on the limit, as the cheapest mix mostly does.
 */
function trialBlend(order: Order, checks: readonly LimitCheck[], predicted: PredictedProperties): Caution[] {
  return checks.flatMap((check): Caution[] => {
    const rules = disagreeing(check, predicted);
    if (rules.length === 0) return [];
    const shorts = LIST.format(rules.map(({ rule }) => VISCOSITY_RULE_TABLE[rule].short));
    const where = limitInWords(order.limits[check.limit], order);
    const what = `by the ${shorts} blending rule${rules.length > 1 ? 's' : ''} ${where} is outside its limit.`;
    return rules.some(({ times }) => times > WIDE_DISAGREEMENT)
      ? [{ kind: 'trial blend', message: `Make a trial blend first: ${what}` }]
      : [{ kind: 'model', message: `On the limit: ${what}` }];
  });
}

function names(stocks: readonly Stock[]): string {
  return stocks.map((stock) => stock.name).join(', ');
}

function asTheRest(predicted: PredictedProperties, used: readonly Stock[], order: Order): Caution[] {
  return predicted.properties.flatMap((property) => {
    const limited = order.limits.some((limit) => limit.property === property.property);
    const taking = used.filter((stock) => property.asTheRest.includes(stock.id));
    if (!limited || taking.length === 0) return [];
    const label = limitInWords(property, order);
    return [
      { kind: 'as the rest' as const, message: `${label}: ${names(taking)} counted as taking the value of the rest.` },
    ];
  });
}

function estimated(predicted: PredictedProperties, used: readonly Stock[], order: Order): Caution[] {
  return predicted.properties.flatMap((property) => {
    const from = used.filter((stock) => property.estimatedFrom.includes(stock.id));
    if (from.length === 0) return [];
    return [
      {
        kind: 'estimate' as const,
        message: `${limitInWords(property, order)} rests on estimated figures of ${names(from)}.`,
      },
    ];
  });
}

function mixedMethods(order: Order, used: readonly Stock[]): Caution[] {
  return order.limits.flatMap((limit) => {
    const methods = new Set(
      used.flatMap((stock) => findFigure(stock, limit.property, limit.celsius)?.method?.trim() || []),
    );
    if (methods.size < 2) return [];
    const message = `${limitInWords(limit, order)}: the stocks were measured by different methods (${[...methods].join(', ')}).`;
    return [{ kind: 'mixed methods' as const, message }];
  });
}

/** A thin and a heavy stock together: the linear rule of Noack reads low (common practice, no source). */
function whereTheRulesFail(order: Order, recipe: Recipe, used: readonly Stock[]): Caution[] {
  const cautions: Caution[] = [];
  if (order.limits.some((limit) => limit.property === 'noack')) {
    const heavy = used.flatMap((stock) => {
      const share = recipe.find((line) => line.stockId === stock.id)?.massFraction ?? 0;
      return share >= 0.1 ? (findFigure(stock, 'kv', 100)?.value ?? []) : [];
    });
    if (heavy.length > 1 && Math.max(...heavy) > 4 * Math.min(...heavy)) {
      cautions.push({
        kind: 'model',
        message: 'Noack volatility: the linear rule reads low for a thin and a heavy stock together.',
      });
    }
  }
  const thickeners = used.filter((stock) => stock.family === 'thickener');
  if (thickeners.length > 0) {
    const message = `${names(thickeners)}: blending viscosities of polymers hold near the trial mix they were worked back from.`;
    cautions.push({ kind: 'model', message });
  }
  return cautions;
}

/** What the order leaves uncounted. */
function uncounted(order: Order, recipe: Recipe): Caution[] {
  const cautions: Caution[] = [];
  const dosesDepressant = order.stocks.some(
    (stock) => stock.family === 'depressant' && recipe.some((line) => line.stockId === stock.id),
  );
  if (order.depressant && !dosesDepressant && order.limits.some((limit) => limit.property === 'pourPoint')) {
    const message = 'Pour points with depressant are counted, but no depressant is dosed: its cost is not.';
    cautions.push({ kind: 'model', message });
  }
  const inDrums = order.stocks.filter(
    (stock) => stock.lotTonnes !== undefined && recipe.some((line) => line.stockId === stock.id),
  );
  if (inDrums.length > 0 && typeof order.batchTonnes !== 'number') {
    cautions.push({ kind: 'model', message: `${names(inDrums)}: whole drums are counted for a fixed batch only.` });
  }
  const flushed = order.stocks.filter(
    (stock) =>
      ((stock.flushCost ?? 0) > 0 || (stock.priceSteps?.length ?? 0) > 0) &&
      recipe.some((line) => line.stockId === stock.id),
  );
  if (flushed.length > 0 && typeof order.batchTonnes !== 'number') {
    cautions.push({
      kind: 'model',
      message: `${names(flushed)}: flush costs and price steps are counted for a fixed batch only.`,
    });
  }
  const bent = order.limits.filter((limit) => limit.aim !== undefined && !averagesByMass(limit, order));
  for (const limit of bent) {
    const message = `${limitInWords(limit, order)}: deviations from the aim are counted to first order near it.`;
    cautions.push({ kind: 'model', message });
  }
  return cautions;
}

function averagesByMass(limit: Limit, order: Order): boolean {
  const definition = propertyDefinition(limit.property, order.ownProperties);
  return definition?.index === 'linear' && definition.basis === 'mass';
}

/** What the reader of a recipe must know beside its figures. */
export function cautionsOf(
  order: Order,
  recipe: Recipe,
  predicted: PredictedProperties,
  checks: readonly LimitCheck[],
): Caution[] {
  const used = order.stocks.filter((stock) => recipe.some((line) => line.stockId === stock.id));
  return [
    ...trialBlend(order, checks, predicted),
    ...asTheRest(predicted, used, order),
    ...estimated(predicted, used, order),
    ...mixedMethods(order, used),
    ...whereTheRulesFail(order, recipe, used),
    ...uncounted(order, recipe),
  ];
}
