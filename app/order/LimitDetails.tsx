import { type Limit, marginFor, type PropertyDefinition } from '../../src';
import { LimitPriceStory } from '../explain/LimitPriceLine';
import { PassingChance } from '../explain/PassingChance';
import { unitOf } from '../parts/limitWords';
import type { Answer } from '../state/answerStore';
import { useWorkbook } from '../state/workbookStore';
import { LimitMore } from './LimitMore';
import { checkOf, mixValue } from './limitAnswer';

const KV100 = { property: 'kv', celsius: 100 };

/** What unfolds under a limit: what it costs, how surely it is met, and the rest of how it is asked for. */
export function LimitDetails({
  orderId,
  index,
  limit,
  definition,
  name,
  answer,
  stale,
  onEdit,
}: {
  orderId: string;
  index: number;
  limit: Limit;
  definition: PropertyDefinition;
  name: string;
  answer: Answer;
  stale: boolean;
  onEdit(label: string, change: (limit: Limit) => void): void;
}) {
  const ownProperties = useWorkbook(({ workbook }) => workbook.ownProperties);
  const order = answer.order ?? { stocks: [], limits: [], ownProperties };
  return (
    <>
      <LimitPriceStory orderId={orderId} index={index} property={limit.property} celsius={limit.celsius} />
      <PassingChance answer={answer} check={checkOf(answer, index, limit)} stale={stale} />
      <LimitMore
        limit={limit}
        definition={definition}
        name={name}
        unit={unitOf(definition)}
        margin={marginFor(limit, order, { kv100: mixValue(answer, KV100) })}
        onEdit={onEdit}
      />
    </>
  );
}
