import { type RefObject, useLayoutEffect, useState } from 'react';

/** True where a message would reach beyond the right edge of the box that scrolls: it then goes to the left. */
export function useNoRoomAtRight(message: RefObject<HTMLElement | null>, shown: boolean): boolean {
  const [noRoom, setNoRoom] = useState(false);
  useLayoutEffect(() => {
    const cell = message.current?.parentElement;
    const box = message.current?.closest('section');
    if (!shown || !message.current || !cell || !box) return;
    const { width } = message.current.getBoundingClientRect();
    setNoRoom(cell.getBoundingClientRect().left + width > box.getBoundingClientRect().right);
  }, [message, shown]);
  return noRoom;
}
