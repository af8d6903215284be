import { Component, type ReactNode } from 'react';

interface BoundaryProps {
  readonly says: string;
  readonly children: ReactNode;
}

/** Keeps a fault of ours within its own part of the page: a sentence stands there until what is drawn changes. */
export class Boundary extends Component<BoundaryProps, { readonly broken: boolean }> {
  override state = { broken: false };

  static getDerivedStateFromError(): { broken: true } {
    return { broken: true };
  }

  override componentDidUpdate(before: BoundaryProps): void {
    if (this.state.broken && before.children !== this.props.children) this.setState({ broken: false });
  }

  override render(): ReactNode {
    return this.state.broken ? <p className="font-semibold text-mend">{this.props.says}</p> : this.props.children;
  }
}
