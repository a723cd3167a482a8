import type { LevellingRunDto } from '../../contracts/levelling';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import { groupDigits, spanText } from '../time';
import { useUnits } from '../ui/units';
import { LevelForm } from './LevelForm';
import { LevelProgress } from './LevelProgress';
import { ProposalView } from './ProposalView';
import type { BoardModel } from './useBoard';
import type { BoardActions } from './useBoardActions';

interface Props {
  readonly model: BoardModel;
  readonly actions: BoardActions;
}

/** Levelling, from the question to the answer. */
export function LevelPanel({ model, actions }: Props) {
  const { levelling, me } = model;
  const units = useUnits();
  const { run } = levelling;
  return (
    <section aria-labelledby="levelling" className="flex min-h-0 flex-1 flex-col overflow-y-auto">
      <header className="flex items-center justify-between px-5 pt-4">
        <h2 id="levelling" className="text-base font-semibold">
          Level this week
        </h2>
        <Button look="quiet" size="small" onClick={() => levelling.setOpen(false)}>
          Close
        </Button>
      </header>
      <div className="flex flex-1 flex-col gap-4 px-5 py-3">
        {levelling.problem ? (
          <Notice look="over" title={units.message(levelling.problem)} live />
        ) : run?.state === 'failed' ? (
          <Notice look="over" title="Levelling stopped." live>
            {run.failure ?? 'The worker gave no reason. Start it again.'}
          </Notice>
        ) : null}
        {!run || run.state === 'failed' ? <LevelForm model={model} /> : null}
        {run && (run.state === 'queued' || run.state === 'running') ? (
          <Running run={run} mine={run.by === me.name} busy={levelling.busy} onCancel={levelling.cancel} />
        ) : null}
        {run?.state === 'proposed' && run.proposal ? (
          <ProposalView proposal={run.proposal} {...{ model, actions }} />
        ) : null}
      </div>
    </section>
  );
}

interface RunningProps {
  readonly run: LevellingRunDto;
  readonly mine: boolean;
  readonly busy: boolean;
  readonly onCancel: () => void;
}

function Running({ run, mine, busy, onCancel }: RunningProps) {
  const units = useUnits();
  const last = run.progress.at(-1);
  return (
    <>
      <p className="text-sm" role="status">
        {run.state === 'queued' ? 'Waiting for a worker.' : `Looking for ${run.seconds} s.`}
        {mine ? '' : ` Started by ${run.by}.`}
      </p>
      <LevelProgress progress={run.progress} seconds={run.seconds} />
      <dl className="grid grid-cols-3 gap-2 text-sm" data-testid="level-progress">
        <Figure name="over the limit" value={last ? units.mass(last.overKg) : '–'} />
        <Figure name="late" value={last ? spanText(last.lateMin) : '–'} />
        <Figure name="moved in all" value={last ? `${groupDigits(last.movedMin)} min` : '–'} />
      </dl>
      <p className="text-xs text-ink-muted">Nothing on the board changes until you accept what is proposed.</p>
      <div>
        <Button onClick={onCancel} busy={busy}>
          Stop looking
        </Button>
      </div>
    </>
  );
}

function Figure({ name, value }: { readonly name: string; readonly value: string }) {
  return (
    <div className="flex flex-col-reverse">
      <dt className="text-2xs text-ink-muted">{name}</dt>
      <dd className="text-sm font-semibold">{value}</dd>
    </div>
  );
}
