import { create } from 'zustand';

export type Theme = 'system' | 'light' | 'dark';

/** What this window shows; not part of the workbook. */
export interface ViewState {
  /** The order on screen. */
  orderId?: string;
  theme: Theme;
  /** Said to those who do not see the page; what it tells of is in sight. */
  announcement: string;
  /** The last thing told in passing, shown until the next one or until it is put away. Empty for none. */
  message: string;
}

export const useView = create<ViewState>(() => ({ theme: 'system', announcement: '', message: '' }));

export function selectOrder(orderId: string | undefined): void {
  useView.setState({ orderId });
}

export function setTheme(theme: Theme): void {
  useView.setState({ theme });
}

/** Reads out what the page shows anyway. The same words twice in a row are said twice. */
export function announce(text: string): void {
  const again = useView.getState().announcement === text;
  useView.setState({ announcement: again ? `${text}\u00a0` : text });
}

/** Shows (and so reads out) what is to be seen nowhere else on the page. An empty text puts the last one away. */
export function tell(text: string): void {
  const again = text !== '' && useView.getState().message === text;
  useView.setState({ message: again ? `${text}\u00a0` : text });
}
