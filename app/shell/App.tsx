import { useRef } from 'react';
import { AnswerPanel } from '../answer/AnswerPanel';
import { OrderEditor } from '../order/OrderEditor';
import { ErrorBoundary } from '../parts/ErrorBoundary';
import { useCommandKeys } from '../parts/useCommandKeys';
import { keyedCommands } from '../state/commands';
import { useView } from '../state/viewStore';
import { StocksTable } from '../stocks/StocksTable';
import { Announcer } from './Announcer';
import { AnswerBar } from './AnswerBar';
import styles from './App.module.css';
import { Footer } from './Footer';
import { Header } from './Header';
import { MessageLine } from './MessageLine';
import { NoOrder } from './NoOrder';
import { OrderList } from './OrderList';
import { PageNav } from './PageNav';
import { useOrderNaming } from './useOrderNaming';

/** The sheet: orders, the order, its answer, and the stocks below. */
export function App() {
  const orderId = useView((view) => view.orderId);
  const orderPlace = useRef<HTMLDivElement>(null);
  useCommandKeys(keyedCommands);
  useOrderNaming(orderPlace, orderId);
  return (
    <div className={styles.page}>
      <Header />
      <MessageLine />
      <PageNav />
      <main className={styles.sheet}>
        <div className={styles.orders}>
          <OrderList orderId={orderId} />
        </div>
        <div id="order" ref={orderPlace} className={styles.order}>
          {orderId === undefined ? (
            <p className={styles.nothing}>Choose an order, or start a new one.</p>
          ) : (
            <ErrorBoundary key={orderId} what="The order">
              <OrderEditor key={orderId} orderId={orderId} />
            </ErrorBoundary>
          )}
        </div>
        <div id="answer" className={styles.answer}>
          <div className={styles.answerSheet}>
            {orderId === undefined ? (
              <NoOrder />
            ) : (
              <ErrorBoundary key={orderId} what="The answer">
                <AnswerPanel orderId={orderId} />
              </ErrorBoundary>
            )}
          </div>
        </div>
        <div id="stocks" className={styles.stocks}>
          <ErrorBoundary what="The stocks">
            <StocksTable />
          </ErrorBoundary>
        </div>
      </main>
      <Footer />
      <AnswerBar orderId={orderId} />
      <Announcer />
    </div>
  );
}
