import { act, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { LimitPriceLine, LimitPriceStory } from '../../../app/explain/LimitPriceLine';
import { OtherRecipes } from '../../../app/explain/OtherRecipes';
import { PassingChance } from '../../../app/explain/PassingChance';
import { Rounded } from '../../../app/explain/Rounded';
import { SecondOpinion } from '../../../app/explain/SecondOpinion';
import { WhatWouldChange } from '../../../app/explain/WhatWouldChange';
import { answerOf, setAnswer } from '../../../app/state/answerStore';
import { setExplained, useExplain } from '../../../app/state/explainStore';
import { useView } from '../../../app/state/viewStore';
import { undo, useWorkbook } from '../../../app/state/workbookStore';
import type { Alternative, Explanation, LimitPrice } from '../../../src';
import { LIGHT, mixOf, orderOf, outcomeOf } from '../answer/answers';
import { answerOnPage, ID } from './explainedOnPage';

const KV40 = { property: 'kv', celsius: 40, min: 38 };
const PRICE: LimitPrice = {
  limit: 0,
  end: 'min',
  stated: 38,
  step: 0.1,
  looserSaves: 1.2,
  tighterCosts: 1.3,
  withoutSaves: 80,
  proven: true,
};

const explanationOf = (change: Partial<Explanation> = {}): Explanation => ({
  limits: [],
  entries: [],
  used: [],
  stopped: 'finished',
  solves: 1,
  ...change,
});

/** An answered order with one limit, of which this was told. */
function explainedAs(explanation: Explanation, change: Parameters<typeof orderOf>[0] = {}) {
  const is = answerOnPage({ order: orderOf({ limits: [KV40], ...change }) });
  setExplained(ID, { recipe: { ...is, told: { value: explanation } } });
}

/** The same order answered anew. */
const answeredAnew = () => act(() => setAnswer(ID, { outcome: mixOf() }));

describe('the price of a limit', () => {
  const place = { orderId: ID, index: 0, property: 'kv', celsius: 40 };

  it('stands beside the rail, greyed once the answer is another', async () => {
    explainedAs(explanationOf({ limits: [PRICE] }));
    render(<LimitPriceLine {...place} />);
    const line = screen.getByText('0.10 mm²/s looser saves €1.20/t');
    expect(line).not.toHaveClass('stale');
    answeredAnew();
    await expect.poll(() => line.className).toMatch('stale');
  });

  it('goes with an answer that has no recipe', () => {
    explainedAs(explanationOf({ limits: [PRICE] }));
    const { container } = render(<LimitPriceLine {...place} />);
    act(() => setAnswer(ID, { outcome: outcomeOf({ stopped: 'refused' }) }));
    expect(container).toBeEmptyDOMElement();
  });

  it('is counted on what the order counts its cost on', () => {
    explainedAs(explanationOf({ limits: [PRICE] }), { costBasis: 'cubic metre' });
    render(<LimitPriceLine {...place} />);
    expect(screen.getByText('0.10 mm²/s looser saves €1.20/m³')).toBeVisible();
  });

  it('is not shown at a limit that costs nothing, nor at another one that took its place', () => {
    explainedAs(explanationOf({ limits: [{ ...PRICE, looserSaves: 0 }] }));
    const { container, rerender } = render(<LimitPriceLine {...place} />);
    expect(container).toBeEmptyDOMElement();
    explainedAs(explanationOf({ limits: [PRICE] }));
    rerender(<LimitPriceLine {...place} property="vi" celsius={undefined} />);
    expect(container).toBeEmptyDOMElement();
  });

  it('has its whole story in the details, aims and all', () => {
    explainedAs(explanationOf({ limits: [PRICE, { ...PRICE, end: 'max', stated: 40, proven: false }] }), {
      limits: [{ ...KV40, max: 40, aim: 39 }],
    });
    render(<LimitPriceStory {...place} />);
    expect(screen.getByRole('heading', { name: 'What it costs: least 38.00 mm²/s' })).toBeVisible();
    expect(screen.getByRole('heading', { name: 'What it costs: most 40.00 mm²/s' })).toBeVisible();
    expect(screen.getAllByText('Without this end the order costs €80.00/t less.')).toHaveLength(2);
    expect(screen.getByText(/aims counted in; not all of them were proven/)).toBeVisible();
  });
});

describe('the chance of passing', () => {
  it('is one half on the limit, and says what it rests on', () => {
    const limit = { property: 'pourPoint', max: -24 };
    const check = { ...limit, limit: 0, value: -24, room: 0, passes: true, onLimit: true };
    answerOnPage({ order: orderOf({ limits: [limit] }) });
    render(<PassingChance answer={answerOf(ID)} check={check} stale={false} />);
    expect(screen.getByText('50 %')).toBeVisible();
    expect(screen.getByText(/by the method’s reproducibility, normal distribution/)).toBeVisible();
  });

  it('is not shown where no precision is known', () => {
    const limit = { property: 'sulphur', max: 10 };
    const check = { ...limit, limit: 0, value: 5, room: 5, passes: true, onLimit: false };
    answerOnPage({ order: orderOf({ limits: [limit] }) });
    const { container } = render(<PassingChance answer={answerOf(ID)} check={check} stale={false} />);
    expect(container).toBeEmptyDOMElement();
  });
});

describe('what would change the recipe', () => {
  const used = { stockId: 'light', pricePerTonne: 1000, massFraction: 0.75, impossibleWithout: false, proven: true };

  it('is a table of stocks in use, the largest first, and of those that are not', () => {
    explainedAs(
      explanationOf({
        used: [
          { ...used, stockId: 'heavy', massFraction: 0.25, impossibleWithout: true },
          { ...used, standsFrom: 900, standsTo: 1100, lossCosts: 36.59 },
        ],
        entries: [{ stockId: 'third', pricePerTonne: 940, entersBelow: 879.6, proven: true }],
      }),
      { stocks: [...orderOf().stocks, { ...LIGHT, id: 'third', name: 'Third oil' }] },
    );
    render(<WhatWouldChange orderId={ID} />);
    const rows = within(screen.getByRole('table', { name: 'Stocks in use' })).getAllByRole('row');
    expect(rows.map((row) => row.textContent)).toEqual([
      'Stockrecipe stands at, EUR/twithout it',
      'Light oil€900.00 to €1,100.00+€36.59/t',
      'Heavy oilno end foundno recipe',
    ]);
    expect(screen.getByRole('table', { name: 'Stocks not in use' })).toHaveTextContent('Third oil€940.00below €879.60');
  });

  it('says that it is being worked out, that time ran out, or why it is missing', () => {
    const is = answerOnPage();
    render(<WhatWouldChange orderId={ID} />);
    expect(screen.getByText(/Working out what would change it/).closest('[aria-busy]')).not.toBeNull();
    act(() => setExplained(ID, { recipe: { ...is, told: { value: explanationOf({ stopped: 'time limit' }) } } }));
    expect(screen.getByText(/time ran out before all of it/).closest('[aria-busy]')).toBeNull();
    act(() => setExplained(ID, { recipe: { ...is, message: 'The solver did not answer in time.' } }));
    expect(screen.getByText('The solver did not answer in time.')).toBeVisible();
  });
});

describe('other recipes', () => {
  const other: Alternative = {
    recipe: [
      { stockId: 'light', massFraction: 0.6 },
      { stockId: 'third', massFraction: 0.4 },
    ],
    costPerTonne: 1512.5,
    dearerBy: 12.5,
    without: ['heavy'],
    instead: ['third'],
    proven: true,
  };

  function showOthers(list: Alternative[], stopped: 'finished' | 'time limit' = 'finished') {
    const stocks = [...orderOf().stocks, { ...LIGHT, id: 'third', name: 'Third oil' }];
    const is = answerOnPage({ order: orderOf({ stocks }) });
    setExplained(ID, { alternatives: { ...is, told: { value: { list, stopped, solves: 3 } } } });
    render(<OtherRecipes orderId={ID} />);
  }
  const excluded = () => useWorkbook.getState().workbook.orders[0]?.excludedProductIds;

  it('are listed with cost, difference and shares, and taken as one step that can be undone', async () => {
    showOthers([other]);
    expect(screen.getByRole('listitem')).toHaveTextContent(
      '€1,512.50/t, +€12.50/t: without Heavy oil; Third oil instead',
    );
    expect(screen.getByText('Light oil 60.00 %, Third oil 40.00 %')).toBeVisible();
    await userEvent.click(screen.getByRole('button', { name: /^Use instead: the recipe without Heavy oil/ }));
    expect(excluded()).toEqual(['heavy']);
    expect(useView.getState().message).toBe('Kept out of Hydraulic oil: Heavy oil. Undo takes it back.');
    undo();
    expect(excluded()).toEqual([]);
    expect(useWorkbook.getState().canUndo).toBe(false);
  });

  it('say when there are none, or may be more', () => {
    showOthers([]);
    expect(screen.getByText(/No other set of stocks/)).toBeVisible();
  });

  it('say what is not proven', () => {
    showOthers([{ ...other, proven: false }], 'time limit');
    expect(screen.getByText(/not proven to be the next cheapest/)).toBeVisible();
    expect(screen.getByText(/there may be more/)).toBeVisible();
  });

  it('cannot be taken once the answer is another', () => {
    showOthers([other]);
    answeredAnew();
    expect(screen.getByRole('button', { name: /^Use instead/ })).toBeDisabled();
  });
});

describe('the rounded recipe', () => {
  const rounded = {
    recipe: [
      { stockId: 'heavy', massFraction: 0.2515 },
      { stockId: 'light', massFraction: 0.7485 },
    ],
    step: 0.001,
    costPerTonne: 1503,
    roundingCosts: 3,
    proven: false,
    offStep: ['heavy', 'light'],
  };

  it('shows every digit, its cost and what is proven, and is copied with them', async () => {
    const user = userEvent.setup();
    const is = answerOnPage({ order: orderOf({ batchTonnes: 10 }) });
    setExplained(ID, { rounded: { ...is, told: { value: rounded } }, roundedTo: '0.1 %' });
    useExplain.setState({ rounding: '0.1 %' });
    render(<Rounded orderId={ID} title="Hydraulic oil" batchTonnes={10} />);
    expect(screen.getByLabelText('Round to what can be weighed')).toHaveDisplayValue('0.1 %');
    expect(screen.getByRole('table')).toHaveTextContent(/Light oil74.857485Heavy oil25.152515/);
    expect(screen.getByText(/rounding costs €3.00\/t; not proven best in these steps/)).toBeVisible();
    expect(screen.getByText('Not in steps of 0.1 %: Heavy oil and Light oil.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Copy rounded recipe' }));
    expect(await navigator.clipboard.readText()).toMatch(
      /^Hydraulic oil, rounded to 0.1 %\nIn steps of 0.1 %, not proven best.*\nNot in steps.*\nStock\t[\s\S]*Light oil\tGroup III\t74.850/,
    );
  });

  it('is not there before it is chosen; where there is none, that is said', () => {
    const is = answerOnPage();
    const { rerender } = render(<Rounded orderId={ID} title="Hydraulic oil" batchTonnes={undefined} />);
    expect(screen.getByLabelText('Round to what can be weighed')).toHaveDisplayValue('not rounded');
    expect(screen.queryByRole('table')).toBeNull();
    act(() => {
      setExplained(ID, { rounded: { ...is, told: { value: undefined } }, roundedTo: '0.1 %' });
      useExplain.setState({ rounding: '0.1 %' });
    });
    expect(screen.getByText(/No recipe in steps of 0.1 % was found/)).toBeVisible();
    // A division of a scale means nothing without a batch.
    act(() => useExplain.setState({ rounding: '5 kg' }));
    rerender(<Rounded orderId={ID} title="Hydraulic oil" batchTonnes={undefined} />);
    expect(screen.getByLabelText('Round to what can be weighed')).toHaveDisplayValue('not rounded');
  });
});

describe('the second opinion', () => {
  it('is told beside its command, and gone with the answer it spoke of', () => {
    const is = answerOnPage();
    render(<SecondOpinion orderId={ID} />);
    expect(screen.getByRole('status')).toBeEmptyDOMElement();
    act(() => setExplained(ID, { opinion: is }));
    expect(screen.getByRole('status')).toHaveTextContent('The second engine is solving it …');
    expect(screen.getByRole('button', { name: 'Second opinion' })).toBeDisabled();
    act(() => setExplained(ID, { opinion: { ...is, told: { value: { kind: 'answered', outcome: is.outcome } } } }));
    expect(screen.getByRole('status')).toHaveTextContent(/^The second engine agrees/);
    answeredAnew();
    expect(screen.getByRole('status')).toBeEmptyDOMElement();
  });
});
