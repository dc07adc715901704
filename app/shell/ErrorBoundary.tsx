import { Component, type ReactNode } from 'react';
import { Button } from '../parts/Button';
import { Notice } from '../parts/Notice';

/** Keeps a fault in one place of the page from taking the others with it. */
export class ErrorBoundary extends Component<{ what: string; children: ReactNode }, { message?: string }> {
  override state: { message?: string } = {};

  static getDerivedStateFromError(error: unknown) {
    return { message: error instanceof Error ? error.message : String(error) };
  }

  override render() {
    if (this.state.message === undefined) return this.props.children;
    return (
      <Notice tone="bad" live>
        <p>
          {this.props.what} cannot be shown: {this.state.message}. The workbook itself is untouched. Try again, or undo
          the last step.
        </p>
        <Button onClick={() => this.setState({ message: undefined })}>Try again</Button>
      </Notice>
    );
  }
}
