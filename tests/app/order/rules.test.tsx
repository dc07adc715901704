import { act, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { DoseList } from '../../../app/order/DoseList';
import { ShareRuleList } from '../../../app/order/ShareRuleList';
import { useOrder } from '../../../app/order/useOrder';
import { setAnswer } from '../../../app/state/answerStore';
import { undo } from '../../../app/state/workbookStore';
import type { Dose, ShareRule, WorkbookOrder } from '../../../src';
import { answerWith, ORDER_ID, orderOnPage, putOrderOnPage, STOCKS } from './orderOnPage';

function Page() {
  const order = useOrder(ORDER_ID);
  return (
    order && (
      <>
        <DoseList order={order} />
        <ShareRuleList order={order} />
      </>
    )
  );
}

function setUp(change: Partial<WorkbookOrder> = {}) {
  putOrderOnPage(change);
  render(<Page />);
  return userEvent.setup();
}

const field = (name: RegExp) => screen.getByRole('textbox', { name });
const choose = (name: string) => screen.getByRole('combobox', { name });

describe('doses', () => {
  it('adds a dose, says that no number stands yet, and takes one in per cent', async () => {
    const user = setUp();
    await user.selectOptions(choose('Add a dose'), 'Thin stock');
    expect(screen.getByText(/No dose given yet: Thin stock/)).toBeVisible();
    await user.type(field(/Dose of Thin stock/), '0,85{Enter}');
    expect(orderOnPage().doses).toEqual([{ stockId: 'thin', exactly: 0.0085 }]);
  });

  it('goes from an exact dose to a range and to "only if used", keeping the number', async () => {
    const user = setUp({ doses: [{ stockId: 'thin', exactly: 0.1 }] });
    await user.selectOptions(choose('How Thin stock is dosed'), 'within');
    expect(orderOnPage().doses).toEqual([{ stockId: 'thin', min: 0.1, max: 0.1 }]);
    await user.selectOptions(choose('How Thin stock is dosed'), 'only if used: within');
    expect(orderOnPage().doses).toEqual([{ stockId: 'thin', min: 0.1, max: 0.1, required: false }]);
    await user.selectOptions(choose('What the dose of Thin stock is counted against'), 'of the base oil');
    expect(orderOnPage().doses[0]?.of).toBe('base oil');
  });

  it('says that a range is the wrong way round, and keeps it', async () => {
    const user = setUp({ doses: [{ stockId: 'thin', min: 0.1, max: 0.2 }] });
    await user.clear(field(/Dose of Thin stock, to/));
    await user.type(field(/Dose of Thin stock, to/), '5{Enter}');
    expect(field(/Dose of Thin stock, to/)).toHaveAccessibleDescription(/below the “from”/);
    expect(orderOnPage().doses).toEqual([{ stockId: 'thin', min: 0.1, max: 0.05 }]);
  });

  it('shows what the engine says of a dose beside it, though the engine’s list is shorter', () => {
    const doses: Dose[] = [
      { stockId: 'gone', max: 0.1 },
      { stockId: 'thin', exactly: 1.5 },
    ];
    setUp({ doses });
    const problems = [{ path: ['doses', 0], message: 'More than everything.' }];
    act(() => answerWith({ stopped: 'refused', problems }, { doses: doses.slice(1) }));
    const [gone, thin] = screen.getAllByRole('listitem');
    if (!gone || !thin) throw new Error('Two doses should be listed.');
    expect(within(thin).getByText('More than everything.')).toBeVisible();
    expect(within(gone).getByText(/no longer in the workbook/)).toBeVisible();
  });

  it('says at the dose of a product without a price that it has none', () => {
    const doses: Dose[] = [{ stockId: 'thin', exactly: 0.1 }];
    setUp({ doses });
    const problems = [{ path: ['doses', 0, 'stockId'], message: 'The dose names a stock that is not in this order.' }];
    act(() => {
      answerWith({ stopped: 'refused', problems }, { doses, stocks: STOCKS.filter(({ id }) => id !== 'thin') });
      setAnswer(ORDER_ID, {
        omitted: [{ productId: 'thin', name: 'Thin stock', message: 'Thin stock has no price: give one.' }],
      });
    });
    expect(screen.getByText('Thin stock has no price: give one.')).toBeVisible();
    expect(screen.queryByText(/not in this order/)).toBeNull();
  });

  it('removes a dose', async () => {
    const user = setUp({ doses: [{ stockId: 'thin', exactly: 0.1 }] });
    await user.click(screen.getByRole('button', { name: 'Remove the dose of Thin stock' }));
    expect(orderOnPage().doses).toEqual([]);
  });
});

describe('rules', () => {
  it('keeps half a rule in the order, says what it lacks, and takes it up', async () => {
    const user = setUp();
    await user.selectOptions(choose('Add a rule'), 'share of some stocks');
    expect(screen.getByText('Choose the stocks; until then the rule asks for nothing.')).toBeVisible();
    await user.selectOptions(choose('Add to: Stocks counted'), 'ester');
    expect(screen.getByText('Give a least or a most; until then the rule asks for nothing.')).toBeVisible();
    expect(orderOnPage().shares).toEqual([{ kind: 'share', set: { families: ['ester'] } }]);
    await user.type(field(/Share, to/), '15{Enter}');
    expect(orderOnPage().shares).toEqual([{ kind: 'share', set: { families: ['ester'] }, max: 0.15 }]);
    expect(screen.queryByText(/asks for nothing/)).toBeNull();
  });

  it('keeps a rule that lost its stocks in its place; undo gives them back, and nothing is doubled', async () => {
    const rule: ShareRule = { kind: 'share', set: { families: ['ester'] }, max: 0.15 };
    const user = setUp({ shares: [rule, { kind: 'count', set: { families: ['PAO'] }, max: 2 }] });
    await user.click(screen.getByRole('button', { name: 'Take ester out of the set' }));
    expect(screen.getByText('Choose the stocks; until then the rule asks for nothing.')).toBeVisible();
    expect(orderOnPage().shares[0]).toEqual({ kind: 'share', set: {}, max: 0.15 });
    expect(screen.getAllByRole('combobox', { name: 'Add to: Stocks counted' })[0]).toHaveFocus();
    act(() => undo());
    expect(orderOnPage().shares[0]).toEqual(rule);
    expect(screen.getAllByRole('listitem')).toHaveLength(2);
  });

  it('keeps a rule whose ends are emptied', async () => {
    const user = setUp({ shares: [{ kind: 'share', set: { families: ['ester'] }, min: 0.1 }] });
    await user.clear(field(/Share, from/));
    await user.tab();
    expect(orderOnPage().shares).toEqual([{ kind: 'share', set: { families: ['ester'] } }]);
    expect(screen.getByText(/^Give a least or a most/)).toBeVisible();
  });

  it('shows what the engine says of a rule beside it, though unfinished ones stand before it', () => {
    const rule: ShareRule = { kind: 'share', set: { stockIds: ['thin'] }, min: 0.5, max: 0.2 };
    setUp({ shares: [{ kind: 'share', set: {} }, rule] });
    const problems = [{ path: ['shares', 0, 'min'], message: 'The least is above the most.' }];
    act(() => answerWith({ stopped: 'refused', problems }, { shares: [rule] }));
    const [unfinished, whole] = screen.getAllByRole('listitem');
    if (!unfinished || !whole) throw new Error('Two rules should be listed.');
    expect(within(whole).getByText('The least is above the most.')).toBeVisible();
    expect(within(unfinished).queryByText('The least is above the most.')).toBeNull();
  });

  it('leaves the focus on the page when a rule is removed', async () => {
    const user = setUp({ shares: [{ kind: 'flag', flag: 'food contact' }] });
    await user.click(screen.getByRole('button', { name: 'Remove this rule' }));
    expect(choose('Add a rule')).toHaveFocus();
  });

  it('edits a ratio', async () => {
    const user = setUp({
      shares: [{ kind: 'ratio', set: { families: ['ester'] }, to: { families: ['PAO'] }, min: 0.1 }],
    });
    await user.selectOptions(choose('Add to: Stocks compared with'), 'mPAO');
    await user.type(field(/Ratio, to/), '0.3{Enter}');
    expect(orderOnPage().shares).toEqual([
      { kind: 'ratio', set: { families: ['ester'] }, to: { families: ['PAO', 'mPAO'] }, min: 0.1, max: 0.3 },
    ]);
  });

  it('counts whole stocks only', async () => {
    const user = setUp({ shares: [{ kind: 'count', set: { families: ['PAO'] }, max: 2 }] });
    await user.clear(field(/Number of stocks, to/));
    await user.type(field(/Number of stocks, to/), '1.5{Enter}');
    expect(field(/Number of stocks, to/)).toHaveAccessibleDescription(/whole number is needed. Until then 2 counts/);
    expect(orderOnPage().shares).toEqual([{ kind: 'count', set: { families: ['PAO'] }, max: 2 }]);
  });

  it('edits which stock excludes which', async () => {
    const rule: ShareRule = { kind: 'excludes', stockId: 'thin', set: { families: ['ester'] } };
    const user = setUp({ shares: [rule] });
    await user.selectOptions(choose('The stock that excludes others'), 'Thick stock');
    expect(orderOnPage().shares).toEqual([{ ...rule, stockId: 'thick' }]);
  });

  it('shows the flag that is asked for, though no product carries it', () => {
    setUp({ shares: [{ kind: 'flag', flag: 'food contact' }] });
    expect(choose('The flag')).toHaveValue('food contact');
  });
});
