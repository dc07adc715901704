import { File as NodeFile } from 'node:buffer';
import { act, renderHook } from '@testing-library/react';
import { beforeEach, describe, expect, test } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import { setAnswer } from '../../../app/state/answerStore';
import { COMMANDS, keyedCommands, useCommands } from '../../../app/state/commands';
import { setSetAside, useSave } from '../../../app/state/saveStore';
import { selectOrder, useView } from '../../../app/state/viewStore';
import { editWorkbook, openWorkbook, undo, useWorkbook } from '../../../app/state/workbookStore';
import { emptyWorkbook, serialiseWorkbook } from '../../../src';
import { resetStores, type TestEnvironment, testEnvironment } from './testEnvironment';

let surroundings: TestEnvironment;
const workbook = () => useWorkbook.getState().workbook;
const onScreen = () => useView.getState().orderId;
const told = () => useView.getState().message;
/** jsdom's files cannot be read as text; Node's can, and are typed apart from the browser's. */
const file = (text: string, name = 'plant.json') => new NodeFile([text], name) as unknown as File;

beforeEach(() => {
  resetStores();
  surroundings = testEnvironment();
});

describe('orders', () => {
  test('a new order comes last and on screen, under a name of its own', () => {
    COMMANDS.newOrder.run();
    COMMANDS.newOrder.run();
    expect(workbook().orders.map(({ id, name }) => [id, name])).toEqual([
      ['id-1', 'New order'],
      ['id-2', 'New order 2'],
    ]);
    expect(onScreen()).toBe('id-2');
  });

  test('a copy stands after its original and shares nothing with it', () => {
    openWorkbook(demoWorkbook());
    selectOrder('driveline-6');
    COMMANDS.duplicateOrder.run();
    expect(workbook().orders[2]).toMatchObject({ id: 'id-1', name: expect.stringMatching(/Drivetrains, copy$/) });
    expect(onScreen()).toBe('id-1');
    editWorkbook('limit', (draft) => void draft.orders[2]?.limits.splice(0));
    expect(workbook().orders[1]?.limits).toHaveLength(4);
  });

  test('deleting shows the neighbour, and undo brings the order back', () => {
    openWorkbook(demoWorkbook());
    const before = workbook();
    const [neighbour, last] = useWorkbook.getState().workbook.orders.slice(-2);
    selectOrder(last?.id);
    COMMANDS.deleteOrder.run();
    expect(onScreen()).toBe(neighbour?.id);
    expect(told()).toMatch(/deleted\. Undo brings it back\.$/);
    undo();
    expect(workbook()).toEqual(before);
  });

  test('without an order there is nothing to copy or delete', () => {
    expect(COMMANDS.duplicateOrder.enabled()).toBe(false);
    expect(COMMANDS.deleteOrder.enabled()).toBe(false);
    COMMANDS.deleteOrder.run();
    COMMANDS.duplicateOrder.run();
    expect(workbook().orders).toEqual([]);
  });
});

describe('the workbook as a file', () => {
  test('is exported as it is, under its own name', () => {
    openWorkbook(demoWorkbook('demo'));
    COMMANDS.exportWorkbook.run();
    expect(surroundings.downloads).toEqual([
      { fileName: 'Kalverhook-Blending-invented-plant.basewright.json', text: serialiseWorkbook(demoWorkbook('demo')) },
    ]);
  });

  test('comes back by import, as one step that can be undone', async () => {
    const text = serialiseWorkbook(demoWorkbook('demo'));
    expect(await COMMANDS.importWorkbook.run(file(text))).toEqual({ ok: true, notes: [] });
    expect(workbook()).toEqual(demoWorkbook('demo'));
    expect(onScreen()).toBe('vg-46-hydraulic');
    undo();
    expect(workbook()).toEqual(emptyWorkbook('w', 'W'));
  });

  test('that cannot be read leaves the workbook as it was, and says why', async () => {
    const before = workbook();
    const result = await COMMANDS.importWorkbook.run(file('{"format": "basewright-workbook", "version": 9}'));
    expect(result).toEqual({ ok: false, message: expect.stringMatching(/newer Basewright \(version 9/) });
    expect(workbook()).toBe(before);
    expect(useWorkbook.getState().canUndo).toBe(false);
  });

  test('that is too large is not even read', async () => {
    const large = file('x');
    Object.defineProperty(large, 'size', { value: 90_000_000 });
    Object.defineProperty(large, 'text', { value: () => Promise.reject(new Error('must not be read')) });
    expect(await COMMANDS.importWorkbook.run(large)).toEqual({
      ok: false,
      message: expect.stringMatching(/too large/),
    });
  });

  test('that is gone by now says so', async () => {
    const gone = file('x');
    Object.defineProperty(gone, 'text', { value: () => Promise.reject(new DOMException('gone', 'NotFoundError')) });
    expect(await COMMANDS.importWorkbook.run(gone)).toEqual({
      ok: false,
      message: expect.stringMatching(/could not be read\. Check/),
    });
  });

  test('with fields that are not known says what was left out', async () => {
    const unknown = file(JSON.stringify({ ...emptyWorkbook('x', 'X'), colour: 1 }));
    const notes = ['colour is not known here and was left out.'];
    expect(await COMMANDS.importWorkbook.run(unknown)).toEqual({ ok: true, notes });
  });
});

describe('another workbook', () => {
  test('an empty one is one command away, and undo leads back', () => {
    openWorkbook(demoWorkbook('demo'));
    COMMANDS.newEmptyWorkbook.run();
    expect(workbook()).toEqual(emptyWorkbook('id-1', 'New workbook'));
    undo();
    expect(workbook()).toEqual(demoWorkbook('demo'));
  });

  test('the demo opens under an id of its own, so that it writes over no other', () => {
    COMMANDS.openDemo.run();
    expect(workbook()).toEqual(demoWorkbook('id-1'));
    expect(workbook().invented).toBe(true);
    expect(onScreen()).toBe('vg-46-hydraulic');
  });

  test('one that could not be read at the start is to be had as it was', () => {
    expect(COMMANDS.exportSetAside.enabled()).toBe(false);
    setSetAside({ text: '{broken' });
    expect(COMMANDS.exportSetAside.enabled()).toBe(true);
    COMMANDS.exportSetAside.run();
    expect(surroundings.downloads[0]?.text).toBe('{broken');
    expect(useSave.getState().state).toBe('saved');
  });
});

describe('commands as objects', () => {
  test('ids are the names they are kept under, and no key does two things', () => {
    for (const [name, { id }] of Object.entries(COMMANDS)) expect(id).toBe(name);
    const keys = keyedCommands.flatMap(({ keys: bound = [] }) => bound);
    expect(new Set(keys).size).toBe(keys.length);
    expect(keys).toContain('Mod+Z');
  });

  test('whoever reads them learns when one becomes possible', () => {
    openWorkbook(demoWorkbook());
    const { result } = renderHook(useCommands);
    expect(result.current.undo.enabled()).toBe(false);
    const before = result.current;
    act(() =>
      editWorkbook('name', (draft) => {
        draft.name = 'New';
      }),
    );
    expect(result.current).not.toBe(before);
    expect(result.current.undo.enabled()).toBe(true);
    expect(result.current.cancelSolve.enabled()).toBe(false);
    act(() => selectOrder('driveline-6'));
    act(() => setAnswer('driveline-6', { phase: 'solving' }));
    expect(result.current.cancelSolve.enabled()).toBe(true);
  });

  test('what they say of undo is true', async () => {
    openWorkbook(demoWorkbook('demo'));
    selectOrder('driveline-6');
    for (const command of [...keyedCommands].filter(({ id }) => id !== 'undo' && id !== 'redo')) {
      if (!command.enabled()) continue;
      const steps = useWorkbook.getState().past.length;
      await command.run();
      expect([command.id, useWorkbook.getState().past.length > steps]).toEqual([command.id, command.undoable]);
      if (command.undoable) undo();
      selectOrder('driveline-6');
    }
  });
});
