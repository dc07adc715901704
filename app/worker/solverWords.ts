const seconds = (ms: number) => `${Math.round(ms / 1000)} s`;

/** What the user is told when a solver worker is in trouble: what failed, then what to do. */
export const WORDS = {
  secondEngine: (reason: string) =>
    `The main solver could not be loaded (${reason}), so a slower one answers. Reload the page to try the main one again.`,
  noEngine: (reason: string) =>
    `No solver can be started here (${reason}). Reload the page; if that does not help, try another browser. The workbook is safe.`,
  restarted: (what: string) => `The solver ${what} and was started again; this answer comes from the new start.`,
  notStarted: 'its worker did not start',
  notLoaded: (ms: number) => `it was not there after ${seconds(ms)}`,
  crashed: (reason: string) =>
    `The solver broke down twice on this order${reason ? ` (${reason})` : ''}. Change the order or reload the page. The workbook is safe.`,
  hung: 'The solver stopped answering twice on this order and was ended. Change the order or reload the page. The workbook is safe.',
  secondEngineHung: (ms: number) =>
    `The slower solver did not answer in ${seconds(ms)} and was ended. Change a limit a little, or reload the page to try the main solver again.`,
  failed: (reason: string) =>
    `The solver broke off (${reason}). Change the order or reload the page. The workbook is safe.`,
  questionLost: (what: string) =>
    `The solver ${what} and was ended, so this part is missing; the answer itself stands. Change the order to have it worked out anew.`,
  cancelled: 'Cancelled: the solver had to be ended, so there is no answer. Solve again by changing the order.',
};
