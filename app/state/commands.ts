import { useMemo } from 'react';
import { emptyWorkbook } from '../../src';
import { demoWorkbook } from '../demo/demoWorkbook';
import { useAnswers } from './answerStore';
import { environment } from './environment';
import { deleteOrder, duplicateOrder, newOrder } from './orderEdits';
import { useSave } from './saveStore';
import { cancelSolve } from './solving';
import { selectOrder, tell, useView } from './viewStore';
import { exportWorkbook, importWorkbook } from './workbookFile';
import { redo, replaceWorkbook, undo, useWorkbook } from './workbookStore';

/** One thing the user can do, shared by button, key and menu. */
export interface Command<Arguments extends unknown[] = []> {
  id: string;
  label: string;
  /** "Mod+Z"; Mod is Ctrl, or Cmd on a Mac. */
  keys?: string | readonly string[];
  enabled(): boolean;
  run(...input: Arguments): unknown;
  /** True where undo takes it back. */
  undoable: boolean;
}

const always = () => true;
const workbook = () => useWorkbook.getState().workbook;
const orderOnScreen = () => workbook().orders.find(({ id }) => id === useView.getState().orderId);

function newEmptyWorkbook(): void {
  replaceWorkbook(emptyWorkbook(environment().newId(), 'New workbook'), 'new empty workbook');
  selectOrder(undefined);
  tell('A new empty workbook. Undo brings the former one back.');
}

function openDemo(): void {
  const demo = demoWorkbook(environment().newId());
  replaceWorkbook(demo, 'opening the demo');
  selectOrder(demo.orders[0]?.id);
  tell('The demo workbook. Its figures are invented. Undo brings the former workbook back.');
}

function exportSetAside(): void {
  const { setAside } = useSave.getState();
  if (setAside) environment().download('set-aside.basewright.json', setAside.text);
}

function isSolving(): boolean {
  const { orderId } = useView.getState();
  return orderId !== undefined && useAnswers.getState().answers[orderId]?.phase === 'solving';
}

export const COMMANDS = {
  undo: {
    id: 'undo',
    label: 'Undo',
    keys: 'Mod+Z',
    enabled: () => useWorkbook.getState().canUndo,
    run: undo,
    undoable: false,
  },
  redo: {
    id: 'redo',
    label: 'Redo',
    keys: ['Mod+Shift+Z', 'Mod+Y'],
    enabled: () => useWorkbook.getState().canRedo,
    run: redo,
    undoable: false,
  },
  newOrder: { id: 'newOrder', label: 'New order', enabled: always, run: newOrder, undoable: true },
  duplicateOrder: {
    id: 'duplicateOrder',
    label: 'Duplicate order',
    enabled: () => orderOnScreen() !== undefined,
    run: duplicateOrder,
    undoable: true,
  },
  deleteOrder: {
    id: 'deleteOrder',
    label: 'Delete order',
    enabled: () => orderOnScreen() !== undefined,
    run: deleteOrder,
    undoable: true,
  },
  cancelSolve: { id: 'cancelSolve', label: 'Cancel', enabled: isSolving, run: cancelSolve, undoable: false },
  newEmptyWorkbook: {
    id: 'newEmptyWorkbook',
    label: 'New empty workbook',
    enabled: always,
    run: newEmptyWorkbook,
    undoable: true,
  },
  openDemo: { id: 'openDemo', label: 'Open the demo', enabled: always, run: openDemo, undoable: true },
  exportWorkbook: {
    id: 'exportWorkbook',
    label: 'Export workbook',
    keys: 'Mod+S',
    enabled: always,
    run: exportWorkbook,
    undoable: false,
  },
  importWorkbook: {
    id: 'importWorkbook',
    label: 'Import workbook',
    enabled: always,
    run: importWorkbook,
    undoable: true,
  },
  exportSetAside: {
    id: 'exportSetAside',
    label: 'Export the workbook that could not be read',
    enabled: () => useSave.getState().setAside !== undefined,
    run: exportSetAside,
    undoable: false,
  },
} satisfies Record<string, Command | Command<[File]>>;

export type Commands = typeof COMMANDS;

const { importWorkbook: _needsAFile, ...withoutInput } = COMMANDS;

/** The commands that need nothing but a key or a click. */
export const keyedCommands: readonly Command[] = Object.values(withoutInput);

/** The commands; whoever reads them renders anew when one of them may have become possible or impossible. */
export function useCommands(): Commands {
  const canUndo = useWorkbook((state) => state.canUndo);
  const canRedo = useWorkbook((state) => state.canRedo);
  const orders = useWorkbook((state) => state.workbook.orders);
  const orderId = useView((state) => state.orderId);
  const solving = useAnswers(({ answers }) => orderId !== undefined && answers[orderId]?.phase === 'solving');
  const setAside = useSave((state) => state.setAside);
  // biome-ignore lint/correctness/useExhaustiveDependencies: a new object tells memoised readers that enabled() may differ
  return useMemo(() => ({ ...COMMANDS }), [canUndo, canRedo, orders, orderId, solving, setAside]);
}
