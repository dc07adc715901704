import { act, fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { useView } from '../../../app/state/viewStore';
import { redo, undo, useWorkbook } from '../../../app/state/workbookStore';
import { StocksTable } from '../../../app/stocks/StocksTable';
import type { Product } from '../../../src';
import { cellAt, figureOnPage, inventedStock, kv, putStocksOnPage, stockOnPage } from './stocksOnPage';

function setUp(products: Product[] = []) {
  putStocksOnPage(products);
  render(<StocksTable />);
}

const products = () => useWorkbook.getState().workbook.products;

function pasteOn(target: Element, text: string) {
  fireEvent.paste(target, { clipboardData: { getData: () => text } });
}

/** As a spreadsheet puts it on the clipboard on Windows: tabs between cells, CR LF after each row. */
const block = (rows: (string | number)[][]) => rows.map((row) => `${row.join('\t')}\r\n`).join('');

describe('pasting into an empty table', () => {
  it('takes 15 rows with headings in one step, and says what could not be read', () => {
    setUp();
    const rows = Array.from({ length: 15 }, (_, i) => [
      `Oil ${i}`,
      'Gp III',
      '1 050,5',
      '0,9',
      20 + i,
      4 + i / 10,
      i === 3 ? 'n.d.' : 12,
      i === 4 ? '1,234' : -15,
      'blue',
    ]);
    const head = [
      'Name',
      'Group',
      'Price (EUR/t)',
      'Sulfur [ppm]',
      'KV40 cSt',
      'Viscosity @ 100 °C [mm2/s]',
      'NOACK %',
      'Pour point, °C',
      'Colour',
    ];
    pasteOn(screen.getByRole('textbox', { name: 'Paste stocks here' }), block([head, ...rows]));
    expect(products()).toHaveLength(15);
    expect(products()[1]).toMatchObject({ name: 'Oil 1', family: 'Group III', pricePerTonne: 1050.5 });
    const [, second] = products();
    expect(second?.figures).toEqual([
      { property: 'sulphur', value: 0.9, origin: 'typical' },
      kv(40, 21),
      kv(100, 4.1),
      { property: 'noack', value: 12, origin: 'typical' },
      { property: 'pourPoint', value: -15, origin: 'typical' },
    ]);
    expect(products()[3]?.unread).toEqual({ noack: 'n.d.' });
    expect(products()[4]?.unread).toEqual({ pourPoint: '1,234' });
    const said = '15 stocks added, 2 cells could not be read. Left out, not a column here or twice: “Colour”.';
    expect(screen.getByText((text) => text.startsWith(said))).toBeVisible();
    expect(useView.getState().announcement).toContain(said);
    act(() => undo());
    expect(products()).toEqual([]);
  });

  it('reads a whole block by the decimal sign it shows, and refuses what that leaves open', async () => {
    setUp();
    pasteOn(
      screen.getByRole('textbox', { name: 'Paste stocks here' }),
      block([
        ['Name', 'Price', 'KV40', 'KV100'],
        ['Priced', '1.182', '46,25', '6,872'],
      ]),
    );
    const [priced] = products();
    expect(priced?.pricePerTonne).toBeUndefined();
    expect(priced?.unread).toEqual({ pricePerTonne: '1.182' });
    expect(priced?.figures).toEqual([kv(40, 46.25), kv(100, 6.872)]);
    act(() => cellAt(0, 'Price').focus());
    expect(cellAt(0, 'Price')).toHaveAccessibleDescription(/“1.182” can be read in two ways. Write 1182 or 1.182/);
    await userEvent.setup().keyboard('1.182{Enter}');
    expect(products()[0]?.pricePerTonne).toBe(1.182);
  });

  it('turns units into those of the columns, says so, and leaves out a column whose unit it cannot turn', () => {
    setUp();
    pasteOn(
      screen.getByRole('textbox', { name: 'Paste stocks here' }),
      block([
        ['Name', 'Price [€/kg]', 'Sulphur [% m/m]', 'On hand [kg]', 'Flash (°F)', 'KV40 (SUS)', 'KV100 (cSt)'],
        ['A', 0.95, 0.4, 20000, 430, 155, 5.4],
        ['B', 'ask', 'rest', '1,182', '', '', ''],
      ]),
    );
    const [a, b] = products();
    expect(a?.pricePerTonne).toBe(950);
    expect(a?.lots).toMatchObject([{ availableTonnes: 20 }]);
    expect(a?.figures).toEqual([
      { property: 'sulphur', value: 4000, origin: 'typical' },
      { property: 'flashPoint', value: 221.111111111, origin: 'typical' },
      kv(100, 5.4),
    ]);
    expect(b?.unread).toEqual({ pricePerTonne: 'ask', availableTonnes: '1,182 kg' });
    expect(b?.figures).toEqual([{ property: 'sulphur', origin: 'as the rest' }]);
    expect(useView.getState().announcement).toContain(
      'Converted: Price from €/kg to EUR/t, Sulphur from % m/m to mg/kg, On hand from kg to t, Flash from °F to °C. ' +
        'Left out for its unit: “KV40 (SUS)” (needed: mm²/s).',
    );
  });

  it('takes a second row of units with the headings', () => {
    setUp();
    pasteOn(
      screen.getByRole('textbox', { name: 'Paste stocks here' }),
      block([
        ['Name', 'Price', 'KV40', 'KV100', 'Colour'],
        ['', '€/kg', 'SUS', '[cSt]', 'ASTM'],
        ['A', 0.95, 155, 5.4, 'L0.5'],
      ]),
    );
    expect(products()).toMatchObject([{ name: 'A', pricePerTonne: 950, figures: [kv(100, 5.4)] }]);
  });

  it('names families it does not know and takes them as “other”', () => {
    setUp();
    const rows = [
      ['Product', 'Family'],
      ['A', 'III'],
      ['B', 'PAO 6'],
      ['C', 'Mystery'],
      ['D', 'ppd'],
      ['E', 'group 2+'],
    ];
    pasteOn(screen.getByRole('textbox', { name: 'Paste stocks here' }), block(rows));
    expect(products().map(({ family }) => family)).toEqual(['Group III', 'PAO', 'other', 'depressant', 'Group II']);
    expect(screen.getByText(/Taken as “other”, not a family here: 1 stock with “Mystery”/)).toBeVisible();
  });

  it('takes a viscosity index where KV40 is not given, and leaves it where it is', () => {
    setUp();
    pasteOn(
      screen.getByRole('textbox', { name: 'Paste stocks here' }),
      block([
        ['Name', 'VI', 'KV40', 'KV100'],
        ['Stated', 120, '', 6],
        ['Known', 99, 40, 6.5],
      ]),
    );
    const [stated, known] = products();
    expect(stated?.figures).toContainEqual({ property: 'vi', value: 120, origin: 'typical' });
    expect(known?.figures).toEqual([kv(40, 40), kv(100, 6.5)]);
    expect(screen.getByText(/Not taken where calculated here: VI/)).toBeVisible();
  });

  it('offers the other ways to begin', async () => {
    setUp();
    expect(screen.getByRole('button', { name: 'Open the demo' })).toBeEnabled();
    await userEvent.setup().click(screen.getByRole('button', { name: /Add a stock/ }));
    expect(products()).toHaveLength(1);
    expect(screen.getByRole('textbox', { name: /Name of the stock/ })).toHaveFocus();
  });
});

describe('pasting into the table', () => {
  it('fills cells from the chosen one on, adding stocks below, as one step', () => {
    setUp([inventedStock('a'), inventedStock('b')]);
    const cell = cellAt(1, 'KV 40');
    act(() => cell.focus());
    pasteOn(cell, '46,2\t6.9\r\n32\t5.4\r\n');
    expect(figureOnPage('b', 'kv', 40)?.value).toBe(46.2);
    expect(figureOnPage('b', 'kv', 100)?.value).toBe(6.9);
    expect(figureOnPage('a', 'kv', 40)).toBeUndefined();
    expect(products()).toHaveLength(3);
    expect(products()[2]?.figures).toEqual([kv(40, 32), kv(100, 5.4)]);
    expect(screen.getByText(/1 stock added, 1 stock changed/)).toBeVisible();
    act(() => undo());
    expect(products()).toHaveLength(2);
    expect(stockOnPage('b').figures).toEqual([]);
  });

  it('leaves one pasted word to the field that is open', async () => {
    setUp([inventedStock('a')]);
    const user = userEvent.setup();
    await user.click(cellAt(0, 'Supplier'));
    await user.paste('Nowhere Oils');
    await user.keyboard('{Enter}');
    expect(stockOnPage('a').supplier).toBe('Nowhere Oils');
  });
});

describe('what is said of a paste', () => {
  const pasteOne = () => pasteOn(cellAt(0, 'Stock'), block([['Heavy'], ['Light']]));

  it('goes when the paste is taken back, and does not come again', () => {
    setUp([inventedStock('a')]);
    act(() => cellAt(0, 'Stock').focus());
    pasteOne();
    expect(screen.getByText(/1 stock added.*Undo takes it back/)).toBeVisible();
    act(() => undo());
    expect(screen.queryByText(/Undo takes it back/)).toBeNull();
    act(() => redo());
    expect(screen.queryByText(/Undo takes it back/)).toBeNull();
  });

  it('goes with the next edit, which an undo would take back instead', async () => {
    setUp([inventedStock('a')]);
    act(() => cellAt(0, 'Stock').focus());
    pasteOne();
    act(() => cellAt(0, 'Price').focus());
    await userEvent.setup().keyboard('870{Enter}');
    expect(screen.queryByText(/Undo takes it back/)).toBeNull();
  });
});
