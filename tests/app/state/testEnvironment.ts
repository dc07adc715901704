import { useAnswers } from '../../../app/state/answerStore';
import { type Environment, setEnvironment } from '../../../app/state/environment';
import { useExplain } from '../../../app/state/explainStore';
import { useSave } from '../../../app/state/saveStore';
import { useView } from '../../../app/state/viewStore';
import { openWorkbook } from '../../../app/state/workbookStore';
import { emptyWorkbook } from '../../../src';

export interface TestEnvironment extends Environment {
  downloads: { fileName: string; text: string }[];
  /** Leaves the page. */
  leave(): void;
  /** True where the browser would ask before the page is left. */
  asksBeforeLeaving(): boolean;
}

/** Surroundings without a browser: ids count up, downloads are kept, and the first paint is at once. */
export function testEnvironment(surroundings: Partial<Environment> = {}): TestEnvironment {
  let ids = 0;
  const downloads: TestEnvironment['downloads'] = [];
  const leaving: (() => void)[] = [];
  let unsaved = () => false;
  const made: TestEnvironment = {
    newId: () => {
      ids += 1;
      return `id-${ids}`;
    },
    now: () => 0,
    today: () => '2026-03-01T08:00:00.000Z',
    download: (fileName, text) => void downloads.push({ fileName, text }),
    onLeaving: (callback) => void leaving.push(callback),
    askBeforeLeaving: (ask) => {
      unsaved = ask;
    },
    asksBeforeLeaving: () => unsaved(),
    afterFirstPaint: (callback) => callback(),
    ...surroundings,
    downloads,
    leave: () => {
      for (const callback of leaving) callback();
    },
  };
  setEnvironment(made);
  return made;
}

/** Every store as it is when the page opens. */
export function resetStores(): void {
  openWorkbook(emptyWorkbook('w', 'W'));
  useView.setState({ orderId: undefined, theme: 'system', announcement: '', message: '' });
  useAnswers.setState({ answers: {} });
  useExplain.setState({ explained: {}, rounding: '' });
  useSave.setState({ state: 'saved', message: undefined, setAside: undefined, unguarded: undefined });
}
