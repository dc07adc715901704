import { memo } from 'react';
import type { WorkbookOrder } from '../../src';
import { IconButton } from '../parts/IconButton';
import { Section } from '../parts/Section';
import { Select } from '../parts/Select';
import { sameButForLimits } from './butForLimits';
import styles from './rules.module.css';
import { editOrder, useProducts } from './useOrder';

/** Products that this order does not use, whatever they cost. */
export const KeptOut = memo(function KeptOut({ order }: { order: WorkbookOrder }) {
  const products = useProducts();
  const out = products.filter(({ id }) => order.excludedProductIds.includes(id));
  const used = products.filter(({ id }) => !order.excludedProductIds.includes(id));
  return (
    <Section title="Kept out of this order" level={3}>
      <div className={styles.set}>
        {out.map(({ id, name }) => (
          <span key={id} className={styles.chip}>
            {name}
            <IconButton
              icon="remove"
              label={`Use ${name} again`}
              onClick={() =>
                editOrder(order.id, `use ${name} again`, (draft) => {
                  draft.excludedProductIds = draft.excludedProductIds.filter((other) => other !== id);
                })
              }
            />
          </span>
        ))}
        {used.length > 0 && (
          <Select
            label="Keep a product out"
            hideLabel
            value=""
            placeholder={out.length ? 'and …' : 'choose …'}
            options={used.map(({ id, name }) => ({ value: id, label: name }))}
            onChange={(id) =>
              editOrder(order.id, 'keep a product out', ({ excludedProductIds }) => excludedProductIds.push(id))
            }
          />
        )}
      </div>
    </Section>
  );
}, sameButForLimits);
