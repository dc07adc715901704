import { create } from 'zustand';

/** Whether the workbook on screen is safe. `message` says what is wrong and what to do. */
export interface SaveState {
  state: 'saved' | 'saving' | 'failed' | 'unavailable';
  message?: string;
}

export const useSave = create<SaveState>(() => ({ state: 'saved' }));

export function setSave(save: SaveState): void {
  useSave.setState(save, true);
}
