import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { PRACTICE_RULE_KINDS, type PracticeDto, type PracticeRuleKind } from '../../contracts/practice';
import type { UnitSystem } from '../../core/quantity/display';
import { api } from '../query/api';
import { QueryProvider } from '../query/client';
import { usePlantEvents } from '../query/usePlantEvents';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import { UnitsProvider } from '../ui/units';
import { RuleForm } from './RuleForm';
import { RuleItem } from './RuleItem';
import { byKind, KIND_WORDS, type RuleState } from './words';

interface Props {
  readonly first: PracticeDto;
  readonly canEnter: boolean;
  readonly canWithdraw: boolean;
  /** Said where the person may not enter rules. */
  readonly whoMay: string;
}

const KEY = ['practice'];
const TITLES: Readonly<Record<RuleState, string>> = {
  waiting: 'To be released',
  inForce: 'In force',
  past: 'No longer in force',
};

function usePractice(first: PracticeDto) {
  const client = useQueryClient();
  const query = useQuery({
    queryKey: KEY,
    queryFn: ({ signal }) => api<PracticeDto>('/api/practice', { signal }),
    initialData: first,
  });
  usePlantEvents((notice) => {
    if (notice === null || notice.kind === 'plant') void client.invalidateQueries({ queryKey: KEY });
  });
  return { practice: query.data, set: (practice: PracticeDto) => client.setQueryData(KEY, practice) };
}

const groupInAddress = (): string | null => new URLSearchParams(location.search).get('group');

function Practice({ first, canEnter, canWithdraw, whoMay }: Props) {
  const { practice, set } = usePractice(first);
  const [groupId] = useState(groupInAddress);
  const [entering, setEntering] = useState<PracticeRuleKind | null>(groupId && canEnter ? 'ventGroup' : null);
  const [said, setSaid] = useState(false);
  const format = new Intl.DateTimeFormat('en-GB', { timeZone: practice.timeZone, dateStyle: 'medium' });
  const day = (instant: string): string => format.format(new Date(instant));
  const open = (kind: PracticeRuleKind | null): void => {
    setSaid(false);
    setEntering(kind);
  };
  return (
    <div className="mt-4">
      {canEnter ? (
        <div className="flex flex-wrap gap-2">
          {PRACTICE_RULE_KINDS.map((kind) => (
            <Button key={kind} aria-pressed={entering === kind} onClick={() => open(kind)}>
              Enter: {KIND_WORDS[kind].title.toLowerCase()}
            </Button>
          ))}
        </div>
      ) : (
        <p className="text-sm text-ink-muted">{whoMay}</p>
      )}
      {entering ? (
        <div className="mt-4 max-w-2xl rounded-md border border-rule bg-surface p-5">
          <RuleForm
            key={entering}
            kind={entering}
            {...{ practice, groupId }}
            onLeave={() => open(null)}
            onSaved={(now) => {
              set(now);
              open(null);
              setSaid(true);
            }}
          />
        </div>
      ) : null}
      <div aria-live="polite">
        {said ? (
          <Notice look="good" className="mt-3">
            The rule is entered. It holds once a quality lead has released it.
          </Notice>
        ) : null}
      </div>
      <LongerWaits {...{ practice }} />
      {(['waiting', 'inForce', 'past'] as const).map((state) => {
        const rules = byKind(practice.rules, state);
        if (rules.length === 0 && state !== 'inForce') return null;
        return (
          <section key={state} className="mt-8" aria-labelledby={`rules-${state}`}>
            <h2 id={`rules-${state}`} className="text-lg">
              {TITLES[state]}
            </h2>
            {state === 'inForce' ? <Unruled {...{ practice }} /> : null}
            {rules.length === 0 ? <p className="mt-2 text-md text-ink-muted">No rule is in force yet.</p> : null}
            <ul className={rules.length === 0 ? '' : 'mt-2 divide-y divide-rule border-y border-rule'}>
              {rules.map((rule) => (
                <RuleItem key={rule.id} {...{ rule, canWithdraw, day }} onChanged={set} />
              ))}
            </ul>
          </section>
        );
      })}
    </div>
  );
}

/** Vent groups for which no rule is in force. */
function Unruled({ practice }: { readonly practice: PracticeDto }) {
  const ruled = new Set(byKind(practice.rules, 'inForce').map(({ ventGroup }) => ventGroup?.id));
  return practice.ventGroups
    .filter(({ id }) => !ruled.has(id))
    .map(({ id, name, numbers }) => (
      <Notice key={id} look="caution" className="mt-3 max-w-2xl" title={`${name}: no rule is in force`}>
        Vents at once: {numbers.ventsAtOnce}; steam ons at once: {numbers.steamOnsAtOnce}. Source: {numbers.source}.
      </Notice>
    ));
}

/** Documents that allow a longer wait than the plant's rule. */
function LongerWaits({ practice }: { readonly practice: PracticeDto }) {
  if (practice.longerWaits.length === 0) return null;
  return (
    <Notice className="mt-5 max-w-2xl" title="The plant’s rule is shorter than these documents, and holds">
      <ul className="list-disc pl-4">
        {practice.longerWaits.map(({ product, document, minutes }) => (
          <li key={`${product} ${document}`}>
            {product}, {document}: {minutes} min
          </li>
        ))}
      </ul>
    </Notice>
  );
}

/** The practice rules as an island. */
export function PracticeDesk({ units, ...props }: Props & { readonly units: UnitSystem }) {
  return (
    <QueryProvider>
      <UnitsProvider system={units}>
        <Practice {...props} />
      </UnitsProvider>
    </QueryProvider>
  );
}
