import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { expect, it, vi } from 'vitest';
import { LazyViscosityChart } from '../../../app/chart/LazyViscosityChart';
import { expectConsole } from '../../support/faceSetup';
import { answered, THICK, THIN } from './chartOrders';

let reachable = false;

vi.mock('../../../app/chart/ViscosityChart', () => {
  if (!reachable) throw new Error('the network is down');
  return { default: () => <p>drawn</p> };
});

it('fetches the chart anew when it is tried again', async () => {
  expectConsole(/error when mocking a module/);
  const { order, outcome } = answered([THIN, THICK], [0.5, 0.5]);
  render(<LazyViscosityChart order={order} outcome={outcome} />);
  expect(await screen.findByRole('alert')).toHaveTextContent('The chart cannot be shown');
  reachable = true;
  await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
  expect(await screen.findByText('drawn')).toBeInTheDocument();
});
