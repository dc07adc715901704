import { IDBFactory } from 'fake-indexeddb';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { demoWorkbook } from '../../../app/demo/demoWorkbook';
import { openDatabase } from '../../../app/storage/database';
import { openWorkbookStorage } from '../../../app/storage/workbookStorage';
import { emptyWorkbook } from '../../../src';

let factory: IDBFactory;
let minutes: number;

beforeEach(() => {
  factory = new IDBFactory();
  minutes = 0;
});

/** A clock that goes two minutes with every look. */
function clock(): string {
  minutes += 2;
  return new Date(Date.parse('2026-03-01T08:00:00Z') + minutes * 60_000).toISOString();
}

const open = () => openWorkbookStorage(factory, clock);

/** Puts a text where the current workbook is kept, as damage would. */
async function damage(text: string): Promise<void> {
  const database = await openDatabase(factory);
  await database.put('workbooks', { id: 'w', name: 'W', text, savedAt: clock() });
  await database.put('meta', 'w', 'current');
  database.close();
}

describe('the workbook in the browser', () => {
  test('is not there at first', async () => {
    expect(await (await open()).loadCurrent()).toEqual({ kind: 'nothing' });
  });

  test('is there again after a reload', async () => {
    const storage = await open();
    await storage.save(demoWorkbook('demo-1'));
    storage.close();
    expect(await (await open()).loadCurrent()).toEqual({
      kind: 'workbook',
      workbook: demoWorkbook('demo-1'),
      notes: [],
    });
  });

  test('is the last one saved; the others are kept', async () => {
    const storage = await open();
    await storage.save(emptyWorkbook('a', 'A'));
    await storage.save(emptyWorkbook('b', 'B'));
    expect(await storage.loadCurrent()).toMatchObject({ workbook: { id: 'b' } });
    await storage.save(emptyWorkbook('a', 'A again'));
    expect(await storage.loadCurrent()).toMatchObject({ workbook: { name: 'A again' } });
    expect(await storage.versions('b')).toHaveLength(1);
  });

  test('keeps earlier states with their dates, newest first', async () => {
    const storage = await open();
    for (const name of ['one', 'two', 'two', 'three']) await storage.save(emptyWorkbook('a', name));
    const versions = await storage.versions('a');
    expect(versions.map(({ text }) => JSON.parse(text).name)).toEqual(['three', 'two', 'one']);
    expect(versions.map(({ savedAt }) => savedAt.slice(11, 16))).toEqual(['08:08', '08:04', '08:02']);
  });

  test('that could not be read back is not saved over one that can', async () => {
    const storage = await open();
    await storage.save(emptyWorkbook('a', 'A'));
    await expect(storage.save({ ...emptyWorkbook('a', 'A'), name: Number.NaN as unknown as string })).rejects.toThrow(
      /name must be a text; it is null/,
    );
    expect(await storage.loadCurrent()).toMatchObject({ kind: 'workbook', workbook: { name: 'A' } });
  });
});

describe('a kept workbook that cannot be read', () => {
  test.each(['{"format": "basewright-wor', '{"format": "basewright-workbook", "version": 99}', ''])(
    '%j is set aside as it was',
    async (text) => {
      await damage(text);
      const storage = await open();
      const loaded = await storage.loadCurrent();
      expect(loaded.kind).toBe('set aside');
      expect(await storage.setAside()).toMatchObject([{ text }]);
      expect(loaded.kind === 'set aside' && loaded.setAside.message.length).toBeGreaterThan(20);
      // The next start is an ordinary one, and what was set aside stays.
      await storage.save(emptyWorkbook('n', 'New'));
      expect(await storage.loadCurrent()).toMatchObject({ workbook: { id: 'n' } });
      expect(await storage.setAside()).toHaveLength(1);
    },
  );
});

describe('a full browser', () => {
  const full = () => new DOMException('no room', 'QuotaExceededError');
  afterEach(() => vi.restoreAllMocks());

  test('makes room: earlier states give way to the present one', async () => {
    const storage = await open();
    await storage.save(emptyWorkbook('b', 'other'));
    await storage.save(emptyWorkbook('a', 'one'));
    await storage.save(emptyWorkbook('a', 'two'));
    vi.spyOn(IDBObjectStore.prototype, 'put').mockImplementationOnce(() => {
      throw full();
    });
    await storage.save(emptyWorkbook('a', 'three'));
    expect(await storage.loadCurrent()).toMatchObject({ workbook: { name: 'three' } });
    // Its own oldest went, and as it sufficed, no more than that: no other workbook pays for this one.
    const names = (await storage.versions('a')).map(({ text }) => JSON.parse(text).name);
    expect(names).toEqual(['three', 'two']);
    expect(await storage.versions('b')).toHaveLength(1);
  });

  test('takes from other workbooks only what its own do not give', async () => {
    const storage = await open();
    await storage.save(emptyWorkbook('b', 'other'));
    await storage.save(emptyWorkbook('b', 'other, later'));
    await storage.save(emptyWorkbook('a', 'one'));
    let left = 2;
    const { put } = IDBObjectStore.prototype;
    vi.spyOn(IDBObjectStore.prototype, 'put').mockImplementation(function (this: IDBObjectStore, ...input) {
      left -= 1;
      if (left >= 0) throw full();
      return put.apply(this, input);
    });
    await storage.save(emptyWorkbook('a', 'two'));
    const names = (await storage.versions('b')).map(({ text }) => JSON.parse(text).name);
    expect(names).toEqual(['other, later']);
    expect(await storage.loadCurrent()).toMatchObject({ workbook: { name: 'two' } });
  });

  test('that stays full fails the save, and what was kept before stays', async () => {
    const storage = await open();
    await storage.save(emptyWorkbook('a', 'one'));
    const put = vi.spyOn(IDBObjectStore.prototype, 'put').mockImplementation(() => {
      throw full();
    });
    await expect(storage.save(emptyWorkbook('a', 'two'))).rejects.toThrow('no room');
    put.mockRestore();
    expect(await storage.loadCurrent()).toMatchObject({ workbook: { name: 'one' } });
  });

  test('with room for the workbook but not for an earlier state keeps the workbook', async () => {
    const storage = await open();
    vi.spyOn(IDBObjectStore.prototype, 'add').mockImplementation(() => {
      throw full();
    });
    await storage.save(emptyWorkbook('a', 'one'));
    expect(await storage.loadCurrent()).toMatchObject({ workbook: { name: 'one' } });
  });
});

describe('a browser that refuses', () => {
  test('rejects when opened', async () => {
    const refusing = {
      open: () => {
        throw new DOMException('refused', 'SecurityError');
      },
    } as unknown as IDBFactory;
    await expect(openWorkbookStorage(refusing, clock)).rejects.toThrow('refused');
  });

  test('a newer page may change the stores: this one steps aside', async () => {
    await open();
    await new Promise((resolve, reject) => {
      const request = factory.deleteDatabase('basewright');
      request.onsuccess = resolve;
      request.onerror = reject;
      request.onblocked = () => reject(new Error('blocked'));
    });
  });
});
