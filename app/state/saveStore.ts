import { create } from 'zustand';

/** Whether the workbook on screen is safe. `message` says what is wrong and what to do. */
export interface SaveState {
  state: 'saved' | 'saving' | 'failed' | 'unavailable';
  message?: string;
  /** A stored workbook that could not be read: kept, and to be had as a file. `message` where that is news. */
  setAside?: { text: string; message?: string };
}

export const useSave = create<SaveState>(() => ({ state: 'saved' }));

/** Says how saving goes. That a workbook was set aside stays in sight as long as nothing worse is to be said. */
export function setSave({ state, message }: Omit<SaveState, 'setAside'>): void {
  useSave.setState(({ setAside }) => ({ state, message: message ?? setAside?.message }));
}

export function setSetAside(setAside: SaveState['setAside']): void {
  useSave.setState({ setAside });
}
