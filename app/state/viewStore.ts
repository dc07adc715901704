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
  /** True where the message outlasts the next change of the workbook: it speaks of more than the last one. */
  messageStays?: boolean;
  /** The order just made, until its name field has the focus. */
  orderToName?: string;
}

export const useView = create<ViewState>(() => ({
  theme: 'system',
  announcement: '',
  message: '',
  messageStays: false,
}));

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

/**
 * Shows (and so reads out) what is to be seen nowhere else on the page. An empty text puts the last one away. It goes
 * with the next change of the workbook ("Undo takes it back" is then true of another step), unless it stays.
 */
export function tell(text: string, { stays = false }: { stays?: boolean } = {}): void {
  const again = text !== '' && useView.getState().message === text;
  useView.setState({ message: again ? `${text}\u00a0` : text, messageStays: stays });
}

/** The workbook has changed: what was told of the change before is over. */
export function endMessage(): void {
  const { message, messageStays } = useView.getState();
  if (message !== '' && !messageStays) tell('');
}

/** Asks for the focus on the name of an order just made; without an order, the wish is met. */
export function nameOrder(orderId: string | undefined): void {
  useView.setState({ orderToName: orderId });
}
