import { beforeEach, describe, expect, test } from 'vitest';
import { useAnswer } from '../../../app/state/answerStore';
import { useExplain } from '../../../app/state/explainStore';
import { useSave } from '../../../app/state/saveStore';
import {
  ANSWER_FIELDS,
  EXPLAIN_FIELDS,
  EXPLAINED_FIELDS,
  SAVE_FIELDS,
  VIEW_FIELDS,
  WORKBOOK_DOCUMENT_FIELDS,
  WORKBOOK_FIELDS,
} from '../../../app/state/stateFields';
import { useView } from '../../../app/state/viewStore';
import { editWorkbook, undo, useWorkbook } from '../../../app/state/workbookStore';
import { loadView, saveView } from '../../../app/storage/viewStorage';
import { serialiseWorkbook } from '../../../src';
import { resetStores } from './testEnvironment';

beforeEach(resetStores);

describe('the table of state fields', () => {
  test('names every field there is', () => {
    const unnamed = (state: object, table: object) => Object.keys(state).filter((field) => !(field in table));
    expect(unnamed(useWorkbook.getState(), WORKBOOK_FIELDS)).toEqual([]);
    expect(unnamed(useView.getState(), VIEW_FIELDS)).toEqual([]);
    expect(unnamed(useSave.getState(), SAVE_FIELDS)).toEqual([]);
    expect(unnamed(useExplain.getState(), EXPLAIN_FIELDS)).toEqual([]);
    expect(Object.keys(WORKBOOK_DOCUMENT_FIELDS)).toEqual(Object.keys(useWorkbook.getState().workbook));
    expect(useAnswer).toBeTypeOf('function');
    for (const passing of [ANSWER_FIELDS, EXPLAIN_FIELDS, EXPLAINED_FIELDS])
      expect(Object.values(passing).some(({ stored, exported }) => stored || exported)).toBe(false);
  });

  test('is right about what stands in the file', () => {
    const { workbook } = useWorkbook.getState();
    const document = JSON.parse(serialiseWorkbook(workbook));
    for (const [field, { exported }] of Object.entries(WORKBOOK_DOCUMENT_FIELDS))
      expect(field in document).toBe(exported);
  });

  test('is right about what undo takes back', () => {
    useView.setState({ theme: 'dark', orderId: 'o' });
    editWorkbook('name', (draft) => {
      draft.name = 'New';
    });
    undo();
    expect(useWorkbook.getState().workbook.name).toBe('W');
    expect(useView.getState()).toMatchObject({ theme: 'dark', orderId: 'o' });
    expect(VIEW_FIELDS.theme.undoable).toBe(false);
  });

  test('is right about what survives a reload', () => {
    localStorage.clear();
    saveView(localStorage, { theme: 'dark', orderId: 'o', announcement: 'said', message: 'told' });
    expect(loadView(localStorage)).toEqual({ theme: 'dark', orderId: 'o' });
    expect(localStorage.getItem('basewright.view')).not.toMatch(/said|told/);
  });
});
