import fc from 'fast-check';
import { beforeEach, describe, expect, test } from 'vitest';
import { MOST_STEPS } from '../../../app/state/history';
import { useView } from '../../../app/state/viewStore';
import {
  editWorkbook,
  endEdit,
  openWorkbook,
  redo,
  replaceWorkbook,
  undo,
  useWorkbook,
} from '../../../app/state/workbookStore';
import { emptyOrder, emptyWorkbook, type Workbook } from '../../../src';
import { resetStores } from './testEnvironment';

const workbook = () => useWorkbook.getState().workbook;
const rename = (name: string, join?: string) =>
  editWorkbook(
    `name ${name}`,
    (draft) => {
      draft.name = name;
    },
    join === undefined ? {} : { join },
  );

beforeEach(resetStores);

describe('an edit', () => {
  test('changes the workbook, and can be undone and made again', () => {
    const before = workbook();
    rename('New');
    expect(workbook().name).toBe('New');
    expect(useWorkbook.getState()).toMatchObject({ canUndo: true, canRedo: false, undoLabel: 'name New' });
    undo();
    expect(workbook()).toEqual(before);
    expect(useWorkbook.getState()).toMatchObject({ canUndo: false, canRedo: true, redoLabel: 'name New' });
    expect(useView.getState().announcement).toBe('Undone: name New');
    redo();
    expect(workbook().name).toBe('New');
  });

  test('leaves what it does not touch the very same object', () => {
    const { settings } = workbook();
    rename('New');
    expect(workbook().settings).toBe(settings);
  });

  test('that changes nothing leaves no step, and nobody is told of a change', () => {
    let told = 0;
    const end = useWorkbook.subscribe(() => {
      told += 1;
    });
    rename('W');
    editWorkbook('the same settings again', (draft) => {
      draft.settings = { currency: 'EUR' };
    });
    end();
    expect(useWorkbook.getState().canUndo).toBe(false);
    expect(told).toBe(0);
  });

  test('after an undo forgets what could have been made again', () => {
    rename('A');
    undo();
    rename('B');
    expect(useWorkbook.getState().canRedo).toBe(false);
  });

  test('that throws changes nothing', () => {
    expect(() =>
      editWorkbook('break', (draft) => {
        draft.name = 'half';
        throw new Error('half way');
      }),
    ).toThrow('half way');
    expect(workbook().name).toBe('W');
    expect(useWorkbook.getState().canUndo).toBe(false);
  });
});

describe('edits in a row', () => {
  test('with one key are one step, however many', () => {
    for (let value = 1; value <= 1000; value += 1) rename(`drag ${value}`, 'drag');
    expect(useWorkbook.getState().past).toHaveLength(1);
    expect(useWorkbook.getState().past[0]?.inverse).toHaveLength(1);
    undo();
    expect(workbook().name).toBe('W');
    redo();
    expect(workbook().name).toBe('drag 1000');
  });

  test('of several kinds under one key are one step too', () => {
    editWorkbook('add', (draft) => void draft.orders.push(emptyOrder('a', 'A')), { join: 'k' });
    editWorkbook('fill', (draft) => void draft.orders[0]?.limits.push({ property: 'vi', min: 95 }), { join: 'k' });
    rename('New', 'k');
    expect(useWorkbook.getState().past).toHaveLength(1);
    undo();
    expect(workbook()).toEqual(emptyWorkbook('w', 'W'));
    redo();
    expect(workbook().orders[0]?.limits).toEqual([{ property: 'vi', min: 95 }]);
  });

  test('with another key, without one, or after the end are a step of their own', () => {
    rename('A', 'one');
    rename('B', 'two');
    rename('C');
    rename('D', 'two');
    endEdit();
    rename('E', 'two');
    expect(useWorkbook.getState().past).toHaveLength(5);
  });

  test('that come back to where they began leave no step', () => {
    rename('A', 'drag');
    rename('W', 'drag');
    endEdit();
    expect(useWorkbook.getState().canUndo).toBe(false);
  });

  test('are over with an undo', () => {
    rename('A', 'drag');
    undo();
    rename('B', 'drag');
    undo();
    expect(workbook().name).toBe('W');
  });
});

describe('the history', () => {
  test('keeps so many steps and no more', () => {
    for (let value = 0; value <= MOST_STEPS; value += 1) rename(`name ${value}`);
    expect(useWorkbook.getState().past).toHaveLength(MOST_STEPS);
    for (let value = 0; value <= MOST_STEPS; value += 1) undo();
    expect(workbook().name).toBe('name 0');
  });

  test('is not in the way with a broken step: it is dropped, and that is said', () => {
    rename('A');
    rename('B');
    const { past } = useWorkbook.getState();
    const broken = {
      label: 'broken',
      forward: [],
      inverse: [{ op: 'replace' as const, path: ['orders', 7, 'name'], value: 'x' }],
    };
    useWorkbook.setState({ past: [...past, broken] });
    undo();
    expect(workbook().name).toBe('B');
    expect(useView.getState().message).toBe('“broken” could not be undone; the workbook is as it was.');
    undo();
    expect(workbook().name).toBe('A');
  });

  test('takes back another workbook in place of this one', () => {
    rename('A');
    replaceWorkbook(emptyWorkbook('x', 'X'), 'import');
    expect(workbook().id).toBe('x');
    undo();
    expect(workbook()).toMatchObject({ id: 'w', name: 'A' });
    redo();
    expect(workbook().id).toBe('x');
    undo();
    undo();
    expect(workbook().name).toBe('W');
  });

  test('starts anew with a loaded workbook', () => {
    rename('A');
    openWorkbook(emptyWorkbook('x', 'X'));
    expect(useWorkbook.getState()).toMatchObject({ canUndo: false, canRedo: false, past: [], future: [] });
  });

  test('says the same words twice where the same thing happens twice', () => {
    rename('A');
    undo();
    const first = useView.getState().announcement;
    rename('A');
    undo();
    expect(useView.getState().announcement).not.toBe(first);
    expect(useView.getState().announcement.trim()).toBe(first);
  });
});

/** Things a user might do, as short programs. */
const step = fc.oneof(
  fc.record({
    kind: fc.constant('rename' as const),
    name: fc.string({ maxLength: 2 }),
    join: fc.option(fc.constantFrom('x', 'y'), { nil: undefined }),
  }),
  fc.record({
    kind: fc.constant('add' as const),
    id: fc.string({ maxLength: 2 }),
    join: fc.option(fc.constantFrom('x', 'y'), { nil: undefined }),
  }),
  fc.record({ kind: fc.constant('remove' as const), at: fc.nat(3) }),
  fc.record({ kind: fc.constant('end' as const) }),
);

test('undo takes any history back to its beginning, and redo forward to its end', () => {
  fc.assert(
    fc.property(fc.array(step, { maxLength: 30 }), (steps) => {
      resetStores();
      const states: Workbook[] = [workbook()];
      for (const action of steps) {
        if (action.kind === 'rename') rename(action.name, action.join);
        else if (action.kind === 'add') {
          editWorkbook('add', (draft) => void draft.orders.push(emptyOrder(action.id, 'O')), { join: action.join });
        } else if (action.kind === 'remove') editWorkbook('remove', (draft) => void draft.orders.splice(action.at, 1));
        else endEdit();
        states.push(workbook());
      }
      const end = workbook();
      while (useWorkbook.getState().canUndo) undo();
      expect(workbook()).toEqual(states[0]);
      while (useWorkbook.getState().canRedo) redo();
      expect(workbook()).toEqual(end);
    }),
  );
});
