import { Component, type ReactNode, Suspense } from 'react';

export interface BoundaryProps {
  /** What the part is called in the sentence that stands in its place. */
  readonly part: string;
  readonly children: ReactNode;
}

/** A part of the page that may come later or fail alone: the rest, and what was typed, stay. */
export class Boundary extends Component<BoundaryProps, { readonly fault: string | null }> {
  override state = { fault: null };

  static getDerivedStateFromError(error: unknown): { readonly fault: string } {
    return { fault: error instanceof Error ? error.message : String(error) };
  }

  override render() {
    if (this.state.fault === null) return <Suspense fallback={<div />}>{this.props.children}</Suspense>;
    return (
      <p role="alert" className="quiet part-fault">
        {this.props.part} cannot be shown: {this.state.fault}. Your document is kept. Reload the page to try again.
      </p>
    );
  }
}
