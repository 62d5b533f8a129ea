import { Component, type ErrorInfo, type ReactNode } from 'react';
import { ErrorState } from '../ui/view-states';

interface ErrorBoundaryProps {
  /** Changing it clears the fault, as when another run is shown. */
  resetKey?: string;
  children: ReactNode;
}

interface ErrorBoundaryState {
  error: Error | null;
  resetKey: string | undefined;
}

/** Keeps a fault in one part of a page from taking the rest with it. */
export class ErrorBoundary extends Component<ErrorBoundaryProps, ErrorBoundaryState> {
  override state: ErrorBoundaryState = { error: null, resetKey: this.props.resetKey };

  static getDerivedStateFromError(thrown: unknown): Partial<ErrorBoundaryState> {
    return { error: thrown instanceof Error ? thrown : new Error(String(thrown)) };
  }

  static getDerivedStateFromProps(props: ErrorBoundaryProps, state: ErrorBoundaryState) {
    return props.resetKey === state.resetKey ? null : { error: null, resetKey: props.resetKey };
  }

  override componentDidCatch(error: Error, info: ErrorInfo): void {
    reportError(new Error(`${error.message}${info.componentStack ?? ''}`, { cause: error }));
  }

  override render(): ReactNode {
    if (this.state.error === null) return this.props.children;
    return <ErrorState message={this.state.error.message} onRetry={() => this.setState({ error: null })} />;
  }
}
