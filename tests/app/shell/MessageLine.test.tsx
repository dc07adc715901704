import { act, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeEach, expect, it } from 'vitest';
import { MessageLine } from '../../../app/shell/MessageLine';
import { COMMANDS } from '../../../app/state/commands';
import { tell } from '../../../app/state/viewStore';
import { editWorkbook, openWorkbook, undo, useWorkbook } from '../../../app/state/workbookStore';
import { emptyWorkbook } from '../../../src';
import { resetStores, testEnvironment } from '../state/testEnvironment';

beforeEach(() => {
  resetStores();
  testEnvironment();
  openWorkbook(emptyWorkbook('w', 'My stocks'));
  render(<MessageLine />);
});

const line = () => screen.getByRole('status');

it('shows what was told last, and only that', () => {
  expect(line()).toBeEmptyDOMElement();
  act(() => COMMANDS.newEmptyWorkbook.run());
  expect(line()).toHaveTextContent('Undo brings the former one back.');
  act(() => COMMANDS.exportWorkbook.run());
  expect(line()).toHaveTextContent(/^Workbook exported as New-workbook\.basewright\.json\.$/);
});

it('can be put away', async () => {
  act(() => tell('Two figures could not be kept.'));
  expect(screen.getByText('Two figures could not be kept.')).toBeVisible();
  await userEvent.click(screen.getByRole('button', { name: 'Hide this message' }));
  expect(line()).toBeEmptyDOMElement();
});

it('drops the offer of an undo once it is undone, and says where an undo failed', () => {
  act(() => COMMANDS.newEmptyWorkbook.run());
  act(undo);
  expect(line()).toBeEmptyDOMElement();
  act(() =>
    useWorkbook.setState({
      past: [{ label: 'odd step', forward: [], inverse: [{ op: 'replace', path: ['no', 'such', 'place'], value: 1 }] }],
    }),
  );
  act(undo);
  expect(line()).toHaveTextContent('“odd step” could not be undone; the workbook is as it was.');
});

const rename = (name: string) =>
  editWorkbook('rename', (workbook) => {
    workbook.name = name;
  });

it('drops the offer of an undo at the next change, which that undo would take back instead', () => {
  act(() => COMMANDS.newEmptyWorkbook.run());
  act(() => rename('New workbook'));
  expect(line()).toHaveTextContent('Undo brings the former one back.');
  act(() => rename('Spring'));
  expect(line()).toBeEmptyDOMElement();
});

it('keeps through edits what it told of a workbook that could not be opened whole', () => {
  act(() => tell('Two figures could not be kept.', { stays: true }));
  act(() => rename('Spring'));
  expect(line()).toHaveTextContent('Two figures could not be kept.');
});
