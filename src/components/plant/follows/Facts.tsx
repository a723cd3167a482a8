import type { ReactNode } from 'react';

export interface Fact {
  readonly name: string;
  readonly value: string;
}

/** Figures that follow from what is typed, as they are this moment. */
export function Facts({ facts, children }: { readonly facts: readonly Fact[]; readonly children?: ReactNode }) {
  return (
    <div className="space-y-3">
      <dl className="divide-y divide-rule border-y border-rule">
        {facts.map(({ name, value }) => (
          <div key={name} className="flex items-baseline justify-between gap-4 py-1.5">
            <dt className="min-w-0 text-sm text-ink-muted">{name}</dt>
            <dd className="text-md font-medium whitespace-nowrap">{value}</dd>
          </div>
        ))}
      </dl>
      {children}
    </div>
  );
}

/** A sentence where nothing can be worked out yet. */
export const NotYet = ({ children }: { readonly children: ReactNode }) => (
  <p className="text-sm text-ink-muted">{children}</p>
);

/** Opens the derivation of what is saved. */
export const WorkingLink = ({ href }: { readonly href: string }) => (
  <a className="text-sm underline underline-offset-2" href={href}>
    Show the working of what is saved
  </a>
);
