import { emptyWorkbook, type Workbook } from '../../src';
import { demoOrders } from './demoOrders';
import { demoProducts } from './demoProducts';

/** An invented plant with invented suppliers and customers, to start from. Every figure in it is made up. */
export function demoWorkbook(id = 'demo'): Workbook {
  return {
    ...emptyWorkbook(id, 'Kalverhook Blending (invented plant)'),
    invented: true,
    products: demoProducts(),
    orders: demoOrders(),
  };
}
