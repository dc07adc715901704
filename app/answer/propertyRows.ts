import {
  type BlendOutcome,
  type LimitCheck,
  type Order,
  type PredictedProperty,
  type PropertyDefinition,
  propertyDefinition,
  VI_DEFINITION,
} from '../../src';
import { limitName, rangeInWords, roomInWords, shortLimitName, withUnit } from '../parts/limitWords';
import { figureText } from '../stocks/figureText';
import { figureKey } from '../stocks/productFigures';

/** One predicted property of the mix against its limits. */
export interface PropertyRow {
  key: string;
  /** Short, as columns are headed: "KV40". */
  name: string;
  fullName: string;
  unit: string;
  /** As shown; "–" where it is unknown. */
  value: string;
  /** Why there is no value. */
  unknown?: string;
  /** Some of the figures behind it are estimates. */
  estimated?: string;
  /** Stocks that took the value of the rest of the mix. */
  asTheRest: string[];
  limits: { place: number; range: string; room: string; tone: 'plain' | 'on' | 'bad' }[];
}

function definitionOf({ property }: Pick<PredictedProperty, 'property'>, order: Order): PropertyDefinition | undefined {
  return property === VI_DEFINITION.id ? VI_DEFINITION : propertyDefinition(property, order.ownProperties);
}

const namesOf = (ids: readonly string[], order: Order) =>
  ids.map((id) => order.stocks.find((stock) => stock.id === id)?.name ?? id).join(', ');

/** "unknown: PAO 4 has no figure" */
function unknownInWords({ value, unknownFrom, property }: PredictedProperty, order: Order): string | undefined {
  if (value !== undefined) return undefined;
  if (unknownFrom.length > 0) {
    const has = unknownFrom.length === 1 ? 'has' : 'have';
    return `unknown: ${namesOf(unknownFrom, order)} ${has} no figure`;
  }
  return property === 'vi' ? 'not defined below a KV100 of 2 mm²/s' : 'cannot be calculated from these figures';
}

function limitRow(check: LimitCheck, order: Order, definition: PropertyDefinition) {
  const limit = order.limits[check.limit];
  if (!limit) return [];
  const tone = !check.passes ? ('bad' as const) : check.onLimit ? ('on' as const) : ('plain' as const);
  const inside = limit.insideBy ? `, inside by ${withUnit(limit.insideBy, definition)}` : '';
  return [
    { place: check.limit, range: rangeInWords(limit, definition) + inside, room: roomInWords(check, definition), tone },
  ];
}

/** The predicted properties of the recipe; none where there is no recipe. */
export function propertyRows(order: Order, { properties, checks }: BlendOutcome): PropertyRow[] {
  return (properties?.properties ?? []).flatMap((predicted): PropertyRow[] => {
    const definition = definitionOf(predicted, order);
    if (!definition) return [];
    const { property, celsius, value, estimatedFrom, asTheRest } = predicted;
    const depressed = property === 'pourPoint' && order.depressant ? ', with depressant' : '';
    const unknown = unknownInWords(predicted, order);
    return [
      {
        key: figureKey(predicted),
        name: (property === 'density' ? limitName : shortLimitName)(predicted, order.ownProperties) + depressed,
        fullName: limitName(predicted, order.ownProperties) + depressed,
        unit: definition.unit === '-' ? '' : definition.unit,
        value: figureText(definition, value),
        ...(unknown && { unknown }),
        ...(estimatedFrom.length > 0 && {
          estimated: `rests on estimated figures of ${namesOf(estimatedFrom, order)}`,
        }),
        asTheRest: value === undefined ? [] : asTheRest.map((id) => namesOf([id], order)),
        limits: checks
          .filter((check) => check.property === property && check.celsius === celsius)
          .flatMap((check) => limitRow(check, order, definition)),
      },
    ];
  });
}
