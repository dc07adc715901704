/**
 * `npm run bench:page`: how fast the built page answers, in one run: from a key on a rail to a new recipe on screen, and
 * how many frames of a drag bring a new one. Prints a table; needs `npm run build` first.
 */
import { chromium } from '@playwright/test';
import { BROWSER_FLAGS, ensureBrowser } from './browser.mjs';
import { startServer } from './serve.mjs';

const ORDERS = [/VG 46/, /6 mm²\/s/, /Multigrade/, /VG 320/, /VG 220.*Mills/];

/** @param {number[]} values @param {number} share */
function quantile(values, share) {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? Number.NaN;
}

/** From a key to the first change of the answer's numbers, after that frame is painted [ms]. @param {import('@playwright/test').Page} page @param {string} key */
async function keyToRecipe(page, key) {
  await page.evaluate(() => {
    const answer = document.querySelector('#answer');
    if (!answer) throw new Error('There is no answer on the page.');
    const before = answer.querySelector('table')?.textContent;
    const state = { pressed: 0, painted: 0 };
    Object.assign(window, { benchState: state });
    document.addEventListener('keydown', () => (state.pressed = performance.now()), { once: true, capture: true });
    const observer = new MutationObserver(() => {
      if (!state.pressed || answer.querySelector('table')?.textContent === before) return;
      observer.disconnect();
      requestAnimationFrame(() => setTimeout(() => (state.painted = performance.now())));
    });
    observer.observe(answer, { subtree: true, childList: true, characterData: true });
  });
  await page.keyboard.press(key);
  await page.waitForFunction(() => /** @type {any} */ (window).benchState.painted > 0, undefined, { timeout: 2000 });
  return page.evaluate(
    () => /** @type {any} */ (window).benchState.painted - /** @type {any} */ (window).benchState.pressed,
  );
}

/**
 * Frames of a drag of two seconds, and how many of them showed a new recipe. The pointer goes down as a mouse does; then
 * it moves once a frame inside the page, as a hand does: moves sent from outside arrive at a third of that rate.
 * @param {import('@playwright/test').Page} page @param {import('@playwright/test').Locator} end
 */
async function drag(page, end) {
  const box = await end.boundingBox();
  if (!box) throw new Error('The end of the rail is not on the page.');
  const x = box.x + box.width / 2;
  const y = box.y + box.height / 2;
  await page.mouse.move(x, y);
  await page.mouse.down();
  const result = await end.evaluate(
    (element, place) =>
      new Promise((resolve) => {
        const state = { frames: 0, recipes: 0, moves: 0, last: '', limit: '' };
        const start = performance.now();
        const step = () => {
          state.frames++;
          const text = document.querySelector('#answer table')?.textContent ?? '';
          if (text !== state.last) state.recipes++;
          state.last = text;
          const limit = element.getAttribute('aria-valuenow') ?? '';
          if (limit !== state.limit) state.moves++;
          state.limit = limit;
          const seconds = (performance.now() - start) / 1000;
          if (seconds > 2) {
            resolve({ ...state, seconds });
            return;
          }
          const clientX = place.x + 40 * Math.sin(3 * seconds);
          element.dispatchEvent(
            new PointerEvent('pointermove', { pointerId: 1, clientX, clientY: place.y, bubbles: true }),
          );
          requestAnimationFrame(step);
        };
        requestAnimationFrame(step);
      }),
    { x, y },
  );
  await page.mouse.up();
  const { frames, recipes, moves, seconds } = /** @type {any} */ (result);
  return { framesPerSecond: frames / seconds, share: recipes / frames, moved: moves / frames };
}

const server = await startServer();
const browser = await chromium.launch({ executablePath: ensureBrowser(), args: BROWSER_FLAGS });
try {
  const page = await browser.newPage({ viewport: { width: 1440, height: 900 } });
  await page.goto(server.url);
  console.log(
    '| order | key to recipe, median ms | most ms | frames a second | frames that moved the limit | frames with a new recipe |',
  );
  for (const order of ORDERS) {
    await page.getByRole('button', { name: order }).first().click();
    await page.waitForTimeout(1500);
    const ends = page.getByRole('slider');
    const times = [];
    for (let k = 0; k < 12; k++) {
      const end = ends.nth(k % (await ends.count()));
      await end.focus();
      // A limit that does not bind changes no recipe: such a key is not counted.
      times.push(await keyToRecipe(page, k % 2 ? 'PageUp' : 'PageDown').catch(() => Number.NaN));
    }
    const counted = times.filter(Number.isFinite);
    const { framesPerSecond, share, moved } = await drag(page, ends.first());
    const cells = [
      order.source,
      quantile(counted, 0.5).toFixed(0),
      Math.max(...counted).toFixed(0),
      framesPerSecond.toFixed(0),
      `${(100 * moved).toFixed(0)} %`,
      `${(100 * share).toFixed(0)} %`,
    ];
    console.log(`| ${cells.join(' | ')} |`);
  }
} finally {
  await browser.close();
  server.close();
}
