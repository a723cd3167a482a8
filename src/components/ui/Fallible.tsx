import { Component, type ReactNode } from 'react';

interface Props {
  readonly children: ReactNode;
  /** Shown instead, should a part fail to load or to draw; the rest of the page stays. */
  readonly instead: ReactNode;
}

/** Keeps the failure of one part of a page to that part. */
export class Fallible extends Component<Props, { readonly failed: boolean }> {
  override state = { failed: false };

  static getDerivedStateFromError(): { failed: boolean } {
    return { failed: true };
  }

  override render(): ReactNode {
    return this.state.failed ? this.props.instead : this.props.children;
  }
}
