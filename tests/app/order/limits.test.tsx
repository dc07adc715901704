import { act, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { OrderEditor } from '../../../app/order/OrderEditor';
import { setAnswer } from '../../../app/state/answerStore';
import { undo, useWorkbook } from '../../../app/state/workbookStore';
import type { Limit } from '../../../src';
import { answerWith, ORDER_ID, orderOnPage, putOrderOnPage } from './orderOnPage';

const KV40: Limit = { property: 'kv', celsius: 40, min: 41.4, max: 50.6 };
const KV40_CHECK = { limit: 0, property: 'kv', celsius: 40, value: 46, passes: true, onLimit: false, room: 4.6 };

function setUp(limits: Limit[] = [KV40]) {
  putOrderOnPage({ limits });
  render(<OrderEditor orderId={ORDER_ID} />);
  return userEvent.setup();
}

const field = (name: RegExp) => screen.getByRole('textbox', { name });
const most = () => screen.getByRole('slider', { name: 'Kinematic viscosity at 40 °C, most' });

beforeEach(() => {
  // jsdom knows no pointer capture and no modal dialogs.
  Element.prototype.setPointerCapture = vi.fn();
  HTMLDialogElement.prototype.showModal = function show() {
    this.open = true;
  };
  HTMLDialogElement.prototype.close = function close() {
    this.open = false;
  };
});

describe('typing a limit', () => {
  it('moves the limit while it is typed, as one step to undo', async () => {
    const user = setUp();
    await user.clear(field(/40 °C, most/));
    await user.type(field(/40 °C, most/), '48,5');
    expect(orderOnPage().limits[0]).toEqual({ ...KV40, max: 48.5 });
    await user.tab();
    expect(useWorkbook.getState().past).toHaveLength(1);
    act(undo);
    expect(orderOnPage().limits[0]).toEqual(KV40);
  });

  it('says beside the field that limits contradict, and keeps what was typed', async () => {
    const user = setUp();
    await user.clear(field(/40 °C, least/));
    await user.type(field(/40 °C, least/), '60{Enter}');
    expect(field(/40 °C, least/)).toHaveValue('60.00');
    expect(field(/40 °C, least/)).toHaveAccessibleDescription(/60.00 mm²\/s, is above the most, 50.60 mm²\/s/);
    expect(orderOnPage().limits[0]).toEqual({ ...KV40, min: 60 });
  });

  it('says below the row what it cannot read, and keeps the limit as it was', async () => {
    const user = setUp();
    await user.clear(field(/40 °C, least/));
    await user.type(field(/40 °C, least/), '4O{Enter}');
    expect(field(/40 °C, least/)).toHaveValue('4O');
    expect(field(/40 °C, least/)).toHaveAccessibleDescription(/“4O” is not a number/);
    expect(field(/40 °C, most/)).toBeValid();
    await user.clear(field(/40 °C, least/));
    await user.type(field(/40 °C, least/), '40{Enter}');
    expect(screen.queryByText(/is not a number/)).toBeNull();
    expect(orderOnPage().limits[0]).toEqual({ ...KV40, min: 40 });
  });

  it('takes an end away where its field is emptied', async () => {
    const user = setUp();
    await user.clear(field(/40 °C, most/));
    await user.tab();
    expect(orderOnPage().limits[0]).toEqual({ property: 'kv', celsius: 40, min: 41.4 });
    expect(screen.queryByRole('slider', { name: /most/ })).toBeNull();
  });

  it('shows a strict end as "below"', () => {
    setUp([{ property: 'kv', celsius: 100, min: 6.9, below: 9.3 }]);
    expect(field(/100 °C, below/)).toHaveValue('9.30');
  });

  it('shows what the engine says of a limit beside it, until the order changes', () => {
    setUp();
    act(() =>
      answerWith({ stopped: 'refused', problems: [{ path: ['limits', 0, 'max'], message: 'Too much asked.' }] }),
    );
    expect(field(/40 °C, most/)).toHaveAccessibleDescription('Too much asked.');
    act(() => setAnswer(ORDER_ID, { stale: true }));
    expect(field(/40 °C, most/)).not.toHaveAccessibleDescription('Too much asked.');
  });
});

describe('the rail', () => {
  it('says the value with its unit', () => {
    setUp();
    expect(most()).toHaveAttribute('aria-valuetext', '50.60 mm²/s');
  });

  it('moves an end by the arrow keys, and stops at the other end', async () => {
    const user = setUp([{ property: 'pourPoint', min: -30, max: -24 }]);
    act(() => screen.getByRole('slider', { name: 'Pour point, most' }).focus());
    await user.keyboard('{ArrowRight}');
    expect(orderOnPage().limits[0]?.max).toBe(-23);
    await user.keyboard('{ArrowLeft}{ArrowLeft}');
    expect(orderOnPage().limits[0]?.max).toBe(-25);
    await user.keyboard('{Shift>}{ArrowLeft}{/Shift}');
    expect(orderOnPage().limits[0]?.max).toBe(-30);
  });

  it('drags an end with the pointer: live, at most once a frame, one step to undo', async () => {
    setUp();
    const end = most();
    const now = Number(end.getAttribute('aria-valuenow'));
    fireEvent.pointerDown(end, { pointerId: 1, button: 0, clientX: 200 });
    expect(end.setPointerCapture).toHaveBeenCalledWith(1);
    // Taken beside its middle and not yet moved, the end stays where it is.
    fireEvent.pointerMove(end, { pointerId: 1, clientX: 200 });
    await act(() => new Promise((done) => requestAnimationFrame(done)));
    expect(orderOnPage().limits[0]?.max).toBe(now);
    fireEvent.pointerMove(end, { pointerId: 1, clientX: 206 });
    fireEvent.pointerMove(end, { pointerId: 1, clientX: 214 });
    await act(() => new Promise((done) => requestAnimationFrame(done)));
    const during = orderOnPage().limits[0]?.max ?? 0;
    expect(during).toBeGreaterThan(now);
    fireEvent.pointerMove(end, { pointerId: 1, clientX: 204 });
    fireEvent.pointerUp(end, { pointerId: 1, clientX: 204 });
    const after = orderOnPage().limits[0]?.max ?? 0;
    expect(after).toBeLessThan(during);
    expect(useWorkbook.getState().past).toHaveLength(1);
    act(undo);
    expect(orderOnPage().limits[0]).toEqual(KV40);
  });

  it('does not follow a pointer that was not pressed', async () => {
    setUp();
    fireEvent.pointerMove(most(), { pointerId: 1, clientX: 250 });
    await act(() => new Promise((done) => requestAnimationFrame(done)));
    expect(orderOnPage().limits[0]).toEqual(KV40);
  });

  it('shows the mix and its room, and greys them while the answer is out of date', async () => {
    setUp();
    act(() => answerWith({ checks: [KV40_CHECK] }));
    expect(screen.getByTestId('mix')).toHaveTextContent('46.00');
    expect(screen.getByText('room 4.60 mm²/s')).toBeVisible();
    expect(screen.getByTestId('mix')).not.toHaveAttribute('data-stale');
    act(() => setAnswer(ORDER_ID, { stale: true }));
    await waitFor(() => expect(screen.getByTestId('mix')).toHaveAttribute('data-stale'));
  });

  it('marks each stock of the recipe, and no other', () => {
    setUp();
    act(() => answerWith({ checks: [KV40_CHECK], recipe: [{ stockId: 'thick', massFraction: 1 }] }));
    expect(screen.getByText('Thick stock: 96.00 mm²/s')).toBeInTheDocument();
    expect(screen.queryByText(/Thin stock: /)).toBeNull();
  });
});

describe('the list of limits', () => {
  it('adds a limit and goes to its first field', async () => {
    const user = setUp([]);
    await user.selectOptions(screen.getByRole('combobox', { name: 'Add a limit' }), 'Viscosity index');
    expect(orderOnPage().limits).toEqual([{ property: 'vi' }]);
    expect(field(/Viscosity index, least/)).toHaveFocus();
    await user.keyboard('95{Enter}');
    expect(orderOnPage().limits).toEqual([{ property: 'vi', min: 95 }]);
  });

  it('offers no limit twice', () => {
    setUp();
    const choices = within(screen.getByRole('combobox', { name: 'Add a limit' }));
    expect(choices.queryByRole('option', { name: 'Kinematic viscosity at 40 °C' })).toBeNull();
    expect(choices.getByRole('option', { name: 'Kinematic viscosity at 100 °C' })).toBeInTheDocument();
  });

  it('adds a property of one’s own with its limit, as one step', async () => {
    const user = setUp([]);
    await user.selectOptions(screen.getByRole('combobox', { name: 'Add a limit' }), 'a property of your own …');
    const dialog = within(screen.getByRole('dialog', { name: 'A property of your own' }));
    await user.click(dialog.getByRole('button', { name: 'Add it' }));
    expect(dialog.getByRole('alert')).toHaveTextContent('Give the property a name.');
    await user.type(dialog.getByRole('textbox', { name: 'Name' }), 'Bio-based carbon');
    await user.selectOptions(dialog.getByRole('combobox', { name: 'How it blends' }), 'linear by volume');
    await user.click(dialog.getByRole('button', { name: 'Add it' }));
    expect(useWorkbook.getState().workbook.ownProperties).toEqual([
      { id: 'own-bio-based-carbon', label: 'Bio-based carbon', unit: '% m/m', rule: 'linear by volume', digits: 1 },
    ]);
    expect(orderOnPage().limits).toEqual([{ property: 'own-bio-based-carbon' }]);
    expect(field(/Bio-based carbon, least, % m\/m/)).toHaveFocus();
    expect(useWorkbook.getState().past).toHaveLength(1);
  });

  it('removes a limit', async () => {
    const user = setUp();
    await user.click(screen.getByRole('button', { name: 'Remove the limit on Kinematic viscosity at 40 °C' }));
    expect(orderOnPage().limits).toEqual([]);
  });

  it('keeps a limit on an unknown property, and says so', () => {
    setUp([{ property: 'mystery', max: 3 }]);
    expect(screen.getByText(/“mystery” is not known here/)).toBeVisible();
  });

  it('edits margin, aim and strictness in the rest of the row', async () => {
    const user = setUp();
    await user.click(screen.getByRole('button', { name: 'Kinematic viscosity at 40 °C' }));
    await user.type(field(/Stay inside by/), '0,5{Enter}');
    await user.type(field(/Aim at/), '46{Enter}');
    await user.type(field(/off the aim counts/), '2{Enter}');
    await user.click(screen.getByRole('checkbox', { name: 'strictly below the most' }));
    expect(orderOnPage().limits[0]).toEqual({ ...KV40, insideBy: 0.5, aim: 46, aimWeight: 2, below: true });
  });
});

describe('a limit that is edited', () => {
  it('keeps its details open and the focus where it was as its temperature changes', async () => {
    const user = setUp([KV40, { property: 'vi', min: 95 }]);
    await user.click(screen.getByRole('button', { name: 'Kinematic viscosity at 40 °C' }));
    const celsius = field(/40 °C, At/);
    await user.clear(celsius);
    await user.type(celsius, '50{Enter}');
    expect(orderOnPage().limits[0]?.celsius).toBe(50);
    expect(field(/50 °C, At/)).toBe(celsius);
    expect(celsius).toHaveFocus();
  });

  it('stays itself when one before it is removed', async () => {
    const user = setUp([{ property: 'vi', min: 95 }, KV40]);
    await user.click(screen.getByRole('button', { name: 'Kinematic viscosity at 40 °C' }));
    const celsius = field(/40 °C, At/);
    await user.click(screen.getByRole('button', { name: 'Remove the limit on Viscosity index' }));
    expect(field(/40 °C, At/)).toBe(celsius);
  });
});

describe('limits from a grade', () => {
  it('keeps margin and aim of a limit it replaces, and says so', async () => {
    const own = { insideBy: 0.5, aim: 46, aimWeight: 2 };
    const user = setUp([{ property: 'kv', celsius: 40, min: 28.8, below: 35.2, ...own }]);
    await user.selectOptions(screen.getByRole('combobox', { name: 'Set limits from a grade' }), 'ISO VG 46');
    expect(orderOnPage().limits).toEqual([{ property: 'kv', celsius: 40, min: 41.4, max: 50.6, ...own }]);
    expect(screen.getByText(/Kept as it was: .*inside by 0\.50 mm²\/s; .*near 46\.00 mm²\/s\./)).toBeVisible();
  });

  it('names what an earlier grade left in the order', async () => {
    const user = setUp([{ property: 'vi', min: 95 }]);
    const grades = () => screen.getByRole('combobox', { name: 'Set limits from a grade' });
    await user.selectOptions(grades(), 'SAE 5W');
    await user.selectOptions(grades(), 'ISO VG 46');
    // SAE J300: 5W is at most 6600 mPa·s cold cranking at −30 °C; its pumping test is for the laboratory.
    const said = screen.getByText(/^ISO VG 46 set/).textContent;
    expect(said).toMatch(/From another grade remain: .*at -30 °C at most 6600 mPa·s.*pump.*Remove them/i);
    expect(said).not.toMatch(/index/);
  });

  it('sets the limits, says what it set, and leaves other limits alone', async () => {
    const user = setUp([{ property: 'vi', min: 95 }]);
    await user.selectOptions(screen.getByRole('combobox', { name: 'Set limits from a grade' }), 'ISO VG 46');
    // ISO 3448: VG 46 is 41.4 to 50.6 mm²/s at 40 °C.
    expect(orderOnPage().limits).toEqual([
      { property: 'vi', min: 95 },
      { property: 'kv', celsius: 40, min: 41.4, max: 50.6 },
    ]);
    expect(screen.getByText(/Kinematic viscosity at 40 °C 41.40 to 50.60 mm²\/s/)).toBeVisible();
  });

  it('keeps a strict end strict, and lists what only the laboratory can show', async () => {
    const user = setUp([{ property: 'kv', celsius: 100, min: 1 }]);
    await user.selectOptions(screen.getByRole('combobox', { name: 'Set limits from a grade' }), 'SAE J306 90');
    // SAE J306: grade 90 is 13.5 to below 18.5 mm²/s at 100 °C, and stays in grade after the 20 h shear test.
    expect(orderOnPage().limits).toEqual([{ property: 'kv', celsius: 100, min: 13.5, below: 18.5 }]);
    expect(orderOnPage().laboratoryOnly.join()).toMatch(/L-45/);
    act(undo);
    expect(orderOnPage().limits).toEqual([{ property: 'kv', celsius: 100, min: 1 }]);
    expect(orderOnPage().laboratoryOnly).toEqual([]);
  });
});
