import { IDBFactory, IDBObjectStore, IDBOpenDBRequest } from 'fake-indexeddb';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import { answerOf } from '../../../app/state/answerStore';
import { COMMANDS } from '../../../app/state/commands';
import type { Environment } from '../../../app/state/environment';
import { useSave } from '../../../app/state/saveStore';
import { bringBack, earlierStates, openStored, storedWorkbooks } from '../../../app/state/shelf';
import { NO_ANSWER, NO_STORAGE, startApp, UNREAD } from '../../../app/state/start';
import { selectOrder, setTheme, useView } from '../../../app/state/viewStore';
import { editWorkbook, undo, useWorkbook } from '../../../app/state/workbookStore';
import { openDatabase } from '../../../app/storage/database';
import { OTHER_TAB } from '../../../app/storage/saver';
import { createSolverClient } from '../../../app/worker/solverClient';
import { emptyWorkbook, serialiseWorkbook } from '../../../src';
import { fakeLocks } from '../storage/fakeLocks';
import { FakeWorkers } from '../worker/fakeWorker';
import { resetStores, testEnvironment } from './testEnvironment';

let factory: IDBFactory;
let workers: FakeWorkers;
let end: () => void = () => {};

const workbook = () => useWorkbook.getState().workbook;
const saved = () => vi.waitFor(() => expect(useSave.getState().state).toBe('saved'));

/** Opens the page anew in the same browser. */
async function open(surroundings: Partial<Environment> = {}) {
  end();
  resetStores();
  workers = new FakeWorkers();
  const made = testEnvironment({ indexedDB: factory, localStorage, ...surroundings });
  end = await startApp(() => createSolverClient({ createWorker: workers.create }));
  return made;
}

beforeEach(() => {
  factory = new IDBFactory();
  localStorage.clear();
  sessionStorage.clear();
});

afterEach(() => {
  end();
  end = () => {};
});

describe('the first start', () => {
  test('opens the demo with its first order on screen, solves and saves it', async () => {
    await open();
    expect(workbook()).toEqual(demoWorkbook('id-1'));
    expect(useView.getState().orderId).toBe('vg-46-hydraulic');
    expect(workers.last.asked).toHaveLength(1);
    workers.last.answer(913);
    expect(answerOf('vg-46-hydraulic').phase).toBe('answered');
    await saved();
  });

  test('asks for no worker before something is on screen', async () => {
    let paint = () => {};
    await open({
      afterFirstPaint: (callback) => {
        paint = callback;
      },
    });
    expect(workers.made).toHaveLength(0);
    paint();
    expect(workers.made).toHaveLength(1);
  });
});

describe('the next start', () => {
  test('brings back the workbook, the order on screen and the theme', async () => {
    const first = await open();
    editWorkbook('name', (draft) => {
      draft.name = 'My plant';
    });
    selectOrder('multigrade-base');
    setTheme('dark');
    first.leave();
    await saved();
    await open();
    expect(workbook().name).toBe('My plant');
    expect(useView.getState()).toMatchObject({ orderId: 'multigrade-base', theme: 'dark' });
    expect(useWorkbook.getState().canUndo).toBe(false);
  });

  test('an order that is no longer there gives way to the first', async () => {
    localStorage.setItem('basewright.view', '{"orderId": "gone"}');
    await open();
    expect(useView.getState().orderId).toBe('vg-46-hydraulic');
  });

  test('brings back an empty workbook too, not the demo', async () => {
    const first = await open();
    COMMANDS.newEmptyWorkbook.run();
    first.leave();
    await saved();
    await open();
    expect(workbook()).toMatchObject({ name: 'New workbook', products: [], orders: [] });
    expect(useView.getState().orderId).toBeUndefined();
  });
});

test('undoing a new order puts another on screen', async () => {
  await open();
  COMMANDS.newOrder.run();
  undo();
  expect(useView.getState().orderId).toBe('vg-46-hydraulic');
});

test('an earlier state can be brought back, and that undone', async () => {
  const first = await open();
  first.leave();
  await saved();
  editWorkbook('name', (draft) => {
    draft.name = 'My plant';
  });
  first.leave();
  await saved();
  const states = await vi.waitFor(async () => {
    const found = await earlierStates();
    expect(found).toHaveLength(1);
    return found;
  });
  const oldest = states.find(({ text }) => !text.includes('My plant'));
  if (!oldest) throw new Error('The first state was not kept.');
  expect(bringBack(oldest)).toBeUndefined();
  expect(workbook()).toEqual(demoWorkbook('id-1'));
  undo();
  expect(workbook().name).toBe('My plant');
  expect(bringBack({ savedAt: '2026-03-01', text: '{' })).toMatch(/not JSON/);
  expect(workbook().name).toBe('My plant');
});

test('a workbook that was replaced is there again after a reload, last change and all', async () => {
  const first = await open();
  editWorkbook('name', (draft) => {
    draft.name = 'My plant';
  });
  // At once, before the change had time to be saved.
  COMMANDS.openDemo.run();
  first.leave();
  await saved();
  await open();
  expect(workbook().name).not.toBe('My plant');
  const entries = await storedWorkbooks();
  expect(entries).toHaveLength(2);
  const mine = entries.find(({ name }) => name === 'My plant');
  if (!mine) throw new Error('The workbook that was replaced is not kept.');
  expect(await openStored(mine)).toBeUndefined();
  expect(workbook().name).toBe('My plant');
  undo();
  expect(workbook().name).not.toBe('My plant');
  expect(await openStored({ id: 'gone', name: 'Gone', savedAt: '' })).toBe('It is not kept here any more.');
});

test('a state replaced by an earlier one stays among the earlier states, however soon it was replaced', async () => {
  let seconds = 0;
  const today = () => {
    seconds += 1;
    return new Date(Date.UTC(2026, 2, 1, 8, 0, seconds)).toISOString();
  };
  const page = await open({ today });
  const demo = { savedAt: today(), text: serialiseWorkbook(workbook()) };
  page.leave();
  await saved();
  editWorkbook('name', (draft) => {
    draft.name = 'Mine';
  });
  page.leave();
  await saved();
  bringBack(demo);
  page.leave();
  await saved();
  await vi.waitFor(async () => {
    const names = (await earlierStates()).map(({ text }) => JSON.parse(text).name);
    expect(names).toEqual(['Mine']);
  });
  // And it does not go with what is typed next.
  editWorkbook('name', (draft) => {
    draft.name = 'Typed next';
  });
  page.leave();
  await saved();
  await vi.waitFor(async () => {
    const names = (await earlierStates()).map(({ text }) => JSON.parse(text).name);
    expect(names).toContain('Mine');
    expect(names).not.toContain('Typed next');
  });
});

test('each window reloads its own workbook, not the one another window saved last', async () => {
  const mine = await open({ sessionStorage });
  editWorkbook('name', (draft) => {
    draft.name = 'Mine';
  });
  mine.leave();
  await saved();
  // Another window has a session of its own.
  const other = await open({ newId: () => 'of-the-other' });
  COMMANDS.newEmptyWorkbook.run();
  other.leave();
  await saved();
  await open();
  expect(workbook().name).toBe('New workbook');
  await open({ sessionStorage });
  expect(workbook().name).toBe('Mine');
});

test('a second tab of the same workbook says that it does not save', async () => {
  const locks = fakeLocks();
  const first = await open({ locks });
  first.leave();
  await saved();
  const { id } = workbook();
  const stillOpen = end;
  end = () => {};
  await open({ locks });
  expect(workbook().id).toBe(id);
  await vi.waitFor(() => expect(useSave.getState()).toMatchObject({ state: 'unavailable', message: OTHER_TAB }), 3000);
  stillOpen();
});

test('without Web Locks the page knows that two tabs are not guarded; with them it does not say so', async () => {
  await open();
  expect(useSave.getState().unguarded).toBe(true);
  await open({ locks: fakeLocks() });
  expect(useSave.getState().unguarded).toBe(false);
});

describe('trouble with storage', () => {
  test('a kept workbook that cannot be read is set aside, the demo opens, and both are said', async () => {
    const database = await openDatabase(factory);
    const text = serialiseWorkbook(emptyWorkbook('w', 'W')).replace('"EUR"', '7');
    await database.put('workbooks', { id: 'w', name: 'W', text, savedAt: '2026-03-01' });
    await database.put('meta', 'w', 'current');
    database.close();
    const surroundings = await open();
    expect(workbook().invented).toBe(true);
    await saved();
    expect(useSave.getState().setAside?.message).toMatch(
      /could not be read\. It is set aside .* settings\.currency must be a text; it is 7\./,
    );
    COMMANDS.exportSetAside.run();
    expect(surroundings.downloads[0]?.text).toBe(text);
    // At the next start it is no news any more, but still to be had.
    await open();
    await saved();
    expect(useSave.getState().setAside?.message).toBeUndefined();
    expect(COMMANDS.exportSetAside.enabled()).toBe(true);
  });

  test('a read that fails once leaves the kept workbook in its place: nothing is saved over it', async () => {
    const first = await open();
    editWorkbook('name', (draft) => {
      draft.name = 'My plant';
    });
    first.leave();
    await saved();
    const get = vi.spyOn(IDBObjectStore.prototype, 'get').mockImplementationOnce(() => {
      throw new DOMException('Internal error.', 'UnknownError');
    });
    const second = await open();
    expect(get).toHaveBeenCalledOnce();
    expect(workbook().invented).toBe(true);
    expect(useSave.getState()).toMatchObject({ state: 'unavailable', message: UNREAD });
    editWorkbook('name', (draft) => {
      draft.name = 'Typed meanwhile';
    });
    second.leave();
    await new Promise((resolve) => setTimeout(resolve, 600));
    expect(useSave.getState().state).toBe('unavailable');
    await open();
    expect(workbook().name).toBe('My plant');
  });

  test('a database that does not open in time leaves the page usable, and says that nothing is saved', async () => {
    vi.useFakeTimers();
    // As behind another page that will not let go: neither success nor error.
    const silent = { open: () => new IDBOpenDBRequest() } as unknown as IDBFactory;
    const opening = open({ indexedDB: silent });
    await vi.advanceTimersByTimeAsync(5_000);
    await opening;
    vi.useRealTimers();
    expect(workbook().invented).toBe(true);
    expect(useSave.getState()).toMatchObject({ state: 'unavailable', message: NO_ANSWER });
  });

  test('leaving is asked about where it would lose work, and only there', async () => {
    const page = await open({ indexedDB: undefined });
    expect(page.asksBeforeLeaving()).toBe(false);
    editWorkbook('name', (draft) => {
      draft.name = 'Typed';
    });
    expect(page.asksBeforeLeaving()).toBe(true);
    COMMANDS.exportWorkbook.run();
    expect(page.asksBeforeLeaving()).toBe(false);
    useSave.setState({ state: 'failed' });
    COMMANDS.newOrder.run();
    expect(page.asksBeforeLeaving()).toBe(true);
    useSave.setState({ state: 'saved' });
    expect(page.asksBeforeLeaving()).toBe(false);
  });

  test('what was set aside earlier may be unreadable too: the workbook opens all the same', async () => {
    const first = await open();
    const { id } = workbook();
    first.leave();
    await saved();
    vi.spyOn(IDBObjectStore.prototype, 'getAll').mockImplementationOnce(() => {
      throw new DOMException('Internal error.', 'UnknownError');
    });
    await open();
    expect(workbook().id).toBe(id);
    await saved();
  });

  test.each([
    ['not there', undefined],
    [
      'refused',
      {
        open: () => {
          throw new DOMException('refused', 'SecurityError');
        },
      } as unknown as IDBFactory,
    ],
  ])('storage %s: the demo opens, and nothing is said to be saved', async (_name, indexedDB) => {
    await open({ indexedDB });
    expect(workbook().invented).toBe(true);
    expect(useSave.getState()).toMatchObject({ state: 'unavailable', message: NO_STORAGE });
    editWorkbook('name', (draft) => {
      draft.name = 'New';
    });
    expect(useSave.getState().state).toBe('unavailable');
    expect(workers.last.asked.length).toBeGreaterThan(0);
  });
});
