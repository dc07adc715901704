import { pricesRise } from '../../src';
import { type Column, dropUnread, keepUnread } from './column';
import { priceStepsText, readPriceSteps } from './priceSteps';

const ID = 'priceSteps';
const RISING =
  'A price for all tonnes cannot rise with the quantity: lower it, or write “excess” at the end. Until then the stock is left out.';

/** Prices that fall with the quantity, as one text. */
export const PRICE_STEPS_COLUMN: Column = {
  id: ID,
  label: 'Price steps',
  title:
    'Prices from a quantity in one batch on: “5 t: 900; 10 t: 880”; “excess” where they count for the tonnes beyond',
  kind: 'text',
  read(product) {
    const unread = product.unread?.[ID];
    if (unread !== undefined) {
      const found = readPriceSteps(unread);
      const why = 'problem' in found ? found.problem : `“${unread}” was not taken. Type it again.`;
      return { text: unread, edit: unread, problem: `${why} Until then the stock is left out.` };
    }
    const text = priceStepsText(product);
    return { text, edit: text, ...(pricesRise(product) && { problem: RISING }) };
  },
  write(product, text, sign) {
    dropUnread(product, ID);
    delete product.priceSteps;
    delete product.priceStepsFor;
    const found = readPriceSteps(text, sign);
    if ('problem' in found) keepUnread(product, ID, text);
    else Object.assign(product, found.steps);
  },
};
