import { type ClipboardEvent, useCallback, useMemo, useRef, useState } from 'react';
import type { Product, Workbook } from '../../src';
import { Button } from '../parts/Button';
import { Notice } from '../parts/Notice';
import { Section } from '../parts/Section';
import { useAnswer } from '../state/answerStore';
import { announce, useView } from '../state/viewStore';
import { useWorkbook } from '../state/workbookStore';
import { EmptyStocks } from './EmptyStocks';
import type { Place } from './gridKeys';
import { namesakes } from './namesakes';
import { isBlock, readBlock } from './pastedBlock';
import { pastedInWords } from './pastedInWords';
import { paste } from './pasteStocks';
import { planPaste } from './planPaste';
import { recipeShares } from './recipeShares';
import { removeStock } from './removeStock';
import { StockDetails } from './StockDetails';
import { KEYS_ID, StocksGrid } from './StocksGrid';
import styles from './StocksTable.module.css';
import { furtherFigures, stockColumns } from './stockColumns';
import { addStock, duplicateStock, setUse } from './stockEdits';
import { nextTrouble, troubledCells } from './troubledCells';
import { useAnswerMarks } from './useAnswerMarks';
import { useGrid } from './useGrid';

const NONE: ReadonlySet<string> = new Set();

/** The stocks with their figures, edited in place; blocks are pasted from a spreadsheet. */
export function StocksTable() {
  const products = useWorkbook(({ workbook }) => workbook.products);
  const ownProperties = useWorkbook(({ workbook }) => workbook.ownProperties);
  const currency = useWorkbook(({ workbook }) => workbook.settings.currency);
  const orderId = useView((view) => view.orderId);
  const order = useWorkbook(({ workbook }) => workbook.orders.find(({ id }) => id === orderId));
  const answer = useAnswer(orderId);
  const recipe = answer.outcome?.recipe;

  const hasOrder = order !== undefined;
  const further = furtherFigures(products, ownProperties, order).join('|');
  const columns = useMemo(
    () => stockColumns(further === '' ? [] : further.split('|'), ownProperties, currency, hasOrder),
    [further, ownProperties, currency, hasOrder],
  );
  const shares = useMemo(() => recipeShares(products, recipe), [products, recipe]);
  const excludedIds = order?.excludedProductIds;
  const excluded = useMemo(() => (excludedIds ? new Set(excludedIds) : NONE), [excludedIds]);
  const missing = useAnswerMarks(products, columns, answer);
  const sameNames = useMemo(() => namesakes(products), [products]);
  const troubled = useMemo(() => troubledCells(products, columns), [products, columns]);

  const onUse = useCallback(
    (product: Product, use: boolean) => orderId !== undefined && setUse(orderId, product, use),
    [orderId],
  );
  const table = useRef<HTMLTableElement>(null);
  const grid = useGrid(table, products, columns, (product) => onUse(product, excluded.has(product.id)));
  const { place, goTo } = grid;
  const product = place && products[place.row];
  const column = place && columns[place.column];

  // "Undo takes it back" is true till the workbook changes again.
  const [pasted, setPasted] = useState<{ words: string; workbook: Workbook }>();
  const said = useWorkbook(({ workbook }) => (pasted?.workbook === workbook ? pasted.words : undefined));

  function takePaste(text: string) {
    const block = readBlock(text);
    if (block.length === 0) return;
    const words = pastedInWords(paste(planPaste(block, columns, place ?? { row: products.length, column: 0 })));
    setPasted({ words, workbook: useWorkbook.getState().workbook });
    announce(words);
  }

  function onPaste(event: ClipboardEvent) {
    const text = event.clipboardData.getData('text/plain');
    // One cell goes into the field that is open; a block goes into the table.
    const inField = event.target instanceof HTMLInputElement || event.target instanceof HTMLTextAreaElement;
    if ((inField && !isBlock(text)) || !product) return;
    event.preventDefault();
    if (grid.editing) grid.actions.revert();
    takePaste(text);
  }

  function onCopy(event: ClipboardEvent) {
    if (grid.editing || !product || !column || !table.current?.contains(event.target as Node)) return;
    event.clipboardData.setData('text/plain', column.read(product).edit);
    event.preventDefault();
  }

  const edit = (to: Place | undefined) => to && goTo(to, {});
  const nameAt = columns.findIndex(({ id }) => id === 'name');
  return (
    <Section
      title="Stocks"
      actions={
        products.length > 0 && (
          <>
            <Button tone="quiet" icon="add" onClick={() => edit({ row: addStock(), column: nameAt })}>
              Add stock
            </Button>
            <Button
              tone="quiet"
              icon="copy"
              disabled={!product}
              onClick={() => product && edit({ row: duplicateStock(product.id) ?? 0, column: nameAt })}
            >
              Duplicate
            </Button>
            <Button tone="quiet" icon="bin" disabled={!product} onClick={() => product && removeStock(product.id)}>
              Remove
            </Button>
          </>
        )
      }
    >
      {said && (
        <Notice className={styles.notice}>
          {said} <Button onClick={() => setPasted(undefined)}>Hide</Button>
        </Notice>
      )}
      {troubled.length > 0 && (
        <Notice tone="warn" className={styles.notice}>
          {troubled.length === 1 ? 'One cell needs attention.' : `${troubled.length} cells need attention.`}{' '}
          <Button onClick={() => edit(nextTrouble(troubled, place))}>Show the next</Button>
        </Notice>
      )}
      {products.length === 0 ? (
        <EmptyStocks onPaste={takePaste} onAdd={() => edit({ row: addStock(), column: nameAt })} />
      ) : (
        <section
          className={styles.scroll}
          aria-label="Table of stocks"
          // biome-ignore lint/a11y/noNoninteractiveTabindex: it scrolls sideways, which keys must be able to do
          tabIndex={0}
          onPaste={onPaste}
          onCopy={onCopy}
        >
          <StocksGrid
            tableRef={table}
            products={products}
            columns={columns}
            shares={shares}
            excluded={excluded}
            missing={missing}
            sameNames={sameNames}
            place={place}
            editing={grid.editing}
            grid={grid.actions}
            onUse={onUse}
            onKeyDown={grid.onKeyDown}
            onFocus={grid.onFocus}
          />
        </section>
      )}
      {product && column && <StockDetails product={product} column={column} ownProperties={ownProperties} />}
      {products.length > 0 && (
        <p role="status" className={styles.word}>
          {grid.said}
        </p>
      )}
      {products.length > 0 && (
        <p className={styles.legend}>
          <span>≈ estimated or assumed</span>
          <span>• in-blend value</span>
          <span>rest: takes the value of the rest</span>
          <span>– unknown</span>
          <span id={KEYS_ID} className={styles.keys}>
            Type to replace, Enter to edit, arrows to move, Tab to the next cell that can be typed in; Escape, then Tab
            leaves the table. Paste a block from a spreadsheet.
          </span>
        </p>
      )}
    </Section>
  );
}
