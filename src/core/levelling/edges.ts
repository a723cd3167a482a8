import type { MoveReason } from './proposal';

/** Why two starts are bound together. */
export interface EdgeCause {
  readonly kind: MoveReason['kind'];
  /** When it bites under the plan that the edge was taken from. */
  readonly minute: number | null;
}

/**
 * start of `to` >= start of `from` + wait. `from` -1: start of `to` >= wait; `to` -1: start of `from` <= -wait.
 */
export interface Edge {
  readonly from: number;
  readonly to: number;
  readonly wait: number;
  readonly cause: EdgeCause;
  /** The other activity where it stays fixed and so is not an end of the edge; -1 where there is none. */
  readonly fixedOther: number;
}

/** Collects edges among free activities; bounds against fixed ones become bounds on the free end. */
export class EdgeList {
  private readonly strongest = new Map<string, Edge>();

  constructor(
    private readonly isFree: (activity: number) => boolean,
    private readonly starts: readonly number[],
  ) {}

  /** start of b >= start of a + wait. */
  add(a: number, b: number, wait: number, cause: EdgeCause): void {
    const freeA = this.isFree(a);
    const freeB = this.isFree(b);
    if (a === b || (!freeA && !freeB)) return;
    if (freeA && freeB) this.keep({ from: a, to: b, wait, cause, fixedOther: -1 });
    else if (freeB) this.keep({ from: -1, to: b, wait: (this.starts[a] as number) + wait, cause, fixedOther: a });
    else this.keep({ from: a, to: -1, wait: wait - (this.starts[b] as number), cause, fixedOther: b });
  }

  atLeast(a: number, start: number, cause: EdgeCause): void {
    if (this.isFree(a)) this.keep({ from: -1, to: a, wait: start, cause, fixedOther: -1 });
  }

  atMost(a: number, start: number, cause: EdgeCause): void {
    if (this.isFree(a)) this.keep({ from: a, to: -1, wait: -start, cause, fixedOther: -1 });
  }

  /** In a fixed order: by the activities' positions. */
  all(): Edge[] {
    return [...this.strongest.values()].sort((x, y) => x.from - y.from || x.to - y.to);
  }

  private keep(edge: Edge): void {
    const key = `${edge.from}>${edge.to}`;
    const known = this.strongest.get(key);
    if (!known || known.wait < edge.wait) this.strongest.set(key, edge);
  }
}
