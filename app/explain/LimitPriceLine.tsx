import { memo } from 'react';
import { type LimitPrice, propertyDefinition } from '../../src';
import { hasAim } from '../answer/proofInWords';
import { classNames } from '../parts/classNames';
import { useLasting } from '../parts/useLasting';
import { useExplained } from '../state/explainStore';
import { useWorkbook } from '../state/workbookStore';
import { type CostUnit, costUnit, isNothing } from './costWords';
import styles from './Explain.module.css';
import { endInWords, priceInShort, priceOrigin, priceStory } from './limitPriceWords';

interface LimitPlace {
  orderId: string;
  /** Place in the order's limits, and what stands there: while the order changes, what was told may speak of another. */
  index: number;
  property: string;
  celsius: number | undefined;
}

interface LimitPrices {
  /** Dearest first. */
  prices: LimitPrice[];
  stale: boolean;
  unit: CostUnit;
  hasAims: boolean;
}

/** The prices of the ends of one limit that were told. */
function useLimitPrices({ orderId, index, property, celsius }: LimitPlace): LimitPrices {
  const { part, stale } = useExplained(orderId, 'recipe');
  const explained = part?.order.limits[index];
  const isSame = explained?.property === property && explained.celsius === celsius;
  const prices = isSame ? (part?.told?.value.limits ?? []).filter(({ limit }) => limit === index) : [];
  return {
    prices: prices.toSorted((a, b) => b.looserSaves - a.looserSaves),
    stale,
    unit: costUnit(part?.order ?? {}),
    hasAims: hasAim(part?.order.limits ?? []),
  };
}

function useDefinition(property: string) {
  const ownProperties = useWorkbook(({ workbook }) => workbook.ownProperties);
  return propertyDefinition(property, ownProperties);
}

/** What the limit costs, in a line beside its rail; nothing for a limit that costs nothing. */
export const LimitPriceLine = memo(function LimitPriceLine({
  className,
  ...place
}: LimitPlace & { className?: string }) {
  const { prices, stale, unit } = useLimitPrices(place);
  const faded = useLasting(stale);
  const definition = useDefinition(place.property);
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  const [price] = prices;
  if (!price || !definition || isNothing(price.looserSaves)) return null;
  return (
    <p className={classNames(styles.price, faded && styles.stale, className)}>
      {priceInShort(price, definition, { currency, unit })}
    </p>
  );
});

/** The fuller story of what the limit costs, for its details. */
export const LimitPriceStory = memo(function LimitPriceStory(place: LimitPlace) {
  const { prices, stale, unit, hasAims } = useLimitPrices(place);
  const faded = useLasting(stale);
  const definition = useDefinition(place.property);
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  if (!definition || prices.length === 0) return null;
  return (
    <div className={classNames(styles.story, faded && styles.stale)}>
      {prices.map((price) => (
        <div key={price.end}>
          <h4>What it costs: {endInWords(price, definition)}</h4>
          <ul>
            {priceStory(price, definition, { currency, unit }).map((line) => (
              <li key={line}>{line}</li>
            ))}
          </ul>
        </div>
      ))}
      <p className={styles.soft}>
        {priceOrigin(
          prices.every(({ proven }) => proven),
          hasAims,
        )}
      </p>
    </div>
  );
});
