import { create } from 'zustand';

export type Theme = 'system' | 'light' | 'dark';

/** What this window shows; not part of the workbook. */
export interface ViewState {
  /** The order on screen. */
  orderId?: string;
  theme: Theme;
  /** The last thing said to the user in passing, also read out by screen readers. */
  announcement: string;
}

export const useView = create<ViewState>(() => ({ theme: 'system', announcement: '' }));

export function selectOrder(orderId: string | undefined): void {
  useView.setState({ orderId });
}

export function setTheme(theme: Theme): void {
  useView.setState({ theme });
}

/** Says something in passing. The same words twice in a row are said twice. */
export function announce(text: string): void {
  const again = useView.getState().announcement === text;
  useView.setState({ announcement: again ? `${text}\u00a0` : text });
}
