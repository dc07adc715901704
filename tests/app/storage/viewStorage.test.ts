import { beforeEach, expect, test } from 'vitest';
import { loadView, saveView } from '../../../app/storage/viewStorage';

const refusing: Storage = {
  ...localStorage,
  length: 0,
  clear() {},
  key: () => null,
  removeItem() {},
  getItem() {
    throw new DOMException('refused', 'SecurityError');
  },
  setItem() {
    throw new DOMException('full', 'QuotaExceededError');
  },
};

beforeEach(() => localStorage.clear());

test('the view comes back as it was left', () => {
  saveView(localStorage, { theme: 'light', orderId: 'a', announcement: '', message: '' });
  expect(loadView(localStorage)).toEqual({ theme: 'light', orderId: 'a' });
});

test.each(['not json', 'null', '[]', '{"theme": "loud", "orderId": 7}'])(
  'what cannot be read is left out: %s',
  (text) => {
    localStorage.setItem('basewright.view', text);
    expect(loadView(localStorage)).toEqual({});
  },
);

test('no storage, or one that refuses, is no trouble', () => {
  for (const storage of [undefined, refusing]) {
    saveView(storage, { theme: 'light', announcement: '', message: '' });
    expect(loadView(storage)).toEqual({});
  }
});
