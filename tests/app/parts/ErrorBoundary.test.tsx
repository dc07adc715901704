import { act, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { ErrorBoundary } from '../../../app/parts/ErrorBoundary';
import { setAnswer } from '../../../app/state/answerStore';
import { openWorkbook } from '../../../app/state/workbookStore';
import { emptyWorkbook } from '../../../src';
import { expectConsole } from '../../support/faceSetup';

let broken = true;

function Part() {
  if (broken) throw new Error('no such stock');
  return <p>all is well</p>;
}

describe('a fault in one place of the page', () => {
  it('is said there, leaves the rest standing, and can be tried again', async () => {
    expectConsole(/no such stock/);
    broken = true;
    render(
      <>
        <ErrorBoundary what="The answer">
          <Part />
        </ErrorBoundary>
        <p>the rest</p>
      </>,
    );
    expect(screen.getByRole('alert')).toHaveTextContent('The answer cannot be shown: no such stock.');
    expect(screen.getByText('the rest')).toBeVisible();
    broken = false;
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(screen.getByText('all is well')).toBeVisible();
  });

  it.each([
    ['the workbook', () => openWorkbook(emptyWorkbook('workbook-1', 'Mended'))],
    ['the answer', () => setAnswer('order-1', { phase: 'answered' })],
  ])('is forgotten when %s has changed', (_what, change) => {
    expectConsole(/no such stock/);
    broken = true;
    render(
      <ErrorBoundary what="The answer">
        <Part />
      </ErrorBoundary>,
    );
    broken = false;
    act(change);
    expect(screen.getByText('all is well')).toBeVisible();
  });
});
