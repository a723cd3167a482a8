import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import type { PracticeDto, PracticeRuleDto } from '../../contracts/practice';
import { api, messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { Dialog } from '../ui/Dialog';
import { Notice } from '../ui/Notice';
import { Tag } from '../ui/Tag';
import { useUnits } from '../ui/units';
import { KIND_WORDS, stateOf, valueTexts } from './words';

interface Props {
  readonly rule: PracticeRuleDto;
  readonly canWithdraw: boolean;
  /** A day in the plant's zone. */
  readonly day: (instant: string) => string;
  readonly onChanged: (practice: PracticeDto) => void;
}

const LOOKS = { inForce: 'room', waiting: 'over', past: 'quiet' } as const;
const STATES = { inForce: 'in force', waiting: 'not released', past: 'no longer in force' } as const;

/** One rule: what it says, where it is from, who entered and who released it. */
export function RuleItem({ rule, canWithdraw, day, onChanged }: Props) {
  const units = useUnits();
  const state = stateOf(rule);
  return (
    <li
      className={`grid gap-x-8 gap-y-3 py-5 md:grid-cols-[13rem_minmax(0,1fr)_14rem] ${state === 'past' ? 'opacity-75' : ''}`}
    >
      <div>
        <h3 className="text-md">{rule.ventGroup ? rule.ventGroup.name : KIND_WORDS[rule.kind].title}</h3>
        {rule.ventGroup ? <p className="text-sm text-ink-muted">{KIND_WORDS[rule.kind].title}</p> : null}
        <p className="mt-2">
          <Tag look={LOOKS[state]}>{STATES[state]}</Tag>
        </p>
      </div>
      <div className="min-w-0">
        <dl className="grid grid-cols-1 gap-x-6 gap-y-2 sm:grid-cols-2">
          {valueTexts(rule, units).map(({ name, value }) => (
            <div key={name}>
              <dt className="text-xs text-ink-muted">{name}</dt>
              <dd className="text-base font-medium">{value}</dd>
            </div>
          ))}
        </dl>
        <p className="mt-3 text-sm text-ink-muted">Source: {rule.source}</p>
      </div>
      <div className="text-sm">
        <p>
          Entered by {rule.enteredBy}, <span className="whitespace-nowrap text-ink-muted">{day(rule.enteredAt)}</span>
        </p>
        {rule.released ? (
          <p>
            Released by {rule.released.by}; in force since{' '}
            <span className="whitespace-nowrap text-ink-muted">{day(rule.released.at)}</span>
          </p>
        ) : null}
        {rule.withdrawnAt ? <p>Until {day(rule.withdrawnAt)}</p> : null}
        <div className="mt-2 flex flex-wrap gap-2">
          {state === 'waiting' && rule.releaseRefusal === null ? <Act {...{ rule, onChanged }} act="release" /> : null}
          {state !== 'past' && canWithdraw ? <Act {...{ rule, onChanged }} act="withdraw" /> : null}
        </div>
        {state === 'waiting' && rule.releaseRefusal ? <p className="text-ink-muted">{rule.releaseRefusal}</p> : null}
      </div>
    </li>
  );
}

const WORDS = {
  release: {
    title: 'Release this rule?',
    does: 'Release',
    says: 'It then holds for every week of this plant, in place of the one in force. Nobody can put a plan on the floor over it. You confirm that its figures are those of its source.',
  },
  withdraw: {
    title: 'Withdraw this rule?',
    does: 'Withdraw',
    says: 'It holds no longer. A vent group without a rule in force has one vent and one steam on at a time.',
  },
} as const;

interface ActProps extends Pick<Props, 'rule' | 'onChanged'> {
  readonly act: 'release' | 'withdraw';
}

function Act({ rule, act, onChanged }: ActProps) {
  const [open, setOpen] = useState(false);
  const words = WORDS[act];
  const send = useMutation({
    mutationFn: () => api<PracticeDto>(`/api/practice/${encodeURIComponent(rule.id)}/${act}`, { method: 'POST' }),
    onSuccess: (practice) => {
      setOpen(false);
      onChanged(practice);
    },
  });
  const look = act === 'release' ? 'main' : 'over';
  const name = rule.ventGroup?.name ?? KIND_WORDS[rule.kind].title;
  return (
    <>
      <Button look={look} size="small" aria-label={`${words.does} ${name}`} onClick={() => setOpen(true)}>
        {words.does}…
      </Button>
      <Dialog
        open={open}
        title={words.title}
        onClose={() => setOpen(false)}
        actions={
          <>
            <Button onClick={() => setOpen(false)}>Not now</Button>
            <Button {...{ look }} busy={send.isPending} onClick={() => send.mutate()}>
              {words.does}
            </Button>
          </>
        }
      >
        <p>{words.says}</p>
        {send.error ? (
          <Notice look="over" live className="mt-3">
            {messageOf(send.error)}
          </Notice>
        ) : null}
      </Dialog>
    </>
  );
}
