import { Component, type ReactNode } from 'react';
import { useAnswers } from '../state/answerStore';
import { useWorkbook } from '../state/workbookStore';
import { Button } from './Button';
import { Notice } from './Notice';

interface Props {
  what: string;
  /** Called before another try: the place to drop what cannot work twice, such as a download that failed. */
  onRetry?(): void;
  children: ReactNode;
}

/** Keeps a fault in one place of the page from taking the others with it. Another workbook or answer is another try. */
export function ErrorBoundary(props: Props) {
  const workbook = useWorkbook((state) => state.workbook);
  const answers = useAnswers((state) => state.answers);
  return <Boundary {...props} workbook={workbook} answers={answers} />;
}

interface BoundaryProps extends Props {
  workbook: unknown;
  answers: unknown;
}

interface State {
  message?: string;
  workbook?: unknown;
  answers?: unknown;
}

class Boundary extends Component<BoundaryProps, State> {
  override state: State = {};

  static getDerivedStateFromError(error: unknown): State {
    return { message: error instanceof Error ? error.message : String(error) };
  }

  static getDerivedStateFromProps({ workbook, answers }: BoundaryProps, state: State): State | null {
    const same = state.workbook === workbook && state.answers === answers;
    return same ? null : { workbook, answers, message: undefined };
  }

  retry = () => {
    this.props.onRetry?.();
    this.setState({ message: undefined });
  };

  override render() {
    if (this.state.message === undefined) return this.props.children;
    return (
      <Notice tone="bad" live>
        <p>
          {this.props.what} cannot be shown: {this.state.message}. The workbook itself is untouched. Try again, or undo
          the last step.
        </p>
        <Button onClick={this.retry}>Try again</Button>
      </Notice>
    );
  }
}
