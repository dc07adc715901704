import { create } from 'zustand';

/** Whether the workbook on screen is safe. `message` says what is wrong and what to do. */
export interface SaveState {
  state: 'saved' | 'saving' | 'failed' | 'unavailable';
  message?: string;
  /** A stored workbook that could not be read: kept, and to be had as a file. `message` where it has just happened. */
  setAside?: { text: string; message?: string };
  /** This browser cannot tell two tabs of one workbook apart: the one that saves last wins. */
  unguarded?: boolean;
}

export const useSave = create<SaveState>(() => ({ state: 'saved' }));

/** Says how saving goes. */
export function setSave({ state, message }: Pick<SaveState, 'state' | 'message'>): void {
  useSave.setState({ state, message });
}

export function setSetAside(setAside: SaveState['setAside']): void {
  useSave.setState({ setAside });
}
