import { useView } from '../state/viewStore';

/** Reads out what was said in passing ("Undone: …"). */
export function Announcer() {
  const announcement = useView((view) => view.announcement);
  return (
    <div className="visually-hidden" role="status" aria-live="polite">
      {announcement}
    </div>
  );
}
