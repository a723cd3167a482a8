import { Button } from '../ui/Button';
import type { BoardModel } from './useBoard';

interface Props {
  readonly model: BoardModel;
  readonly onSlip: () => void;
  readonly onIssue: () => void;
}

/** What a person's roles let them do with the week. */
export function BarActions({ model, onSlip, onIssue }: Props) {
  const { mayPlan, mayAgree, mayEdit, levelling, evaluation } = model;
  const steamOver = evaluation.breaches.some((breach) => breach.class === 'steam');
  const waiting = levelling.run?.state === 'proposed';
  return (
    <>
      {mayPlan ? (
        <>
          <Button size="small" className="max-sm:hidden" onClick={onSlip} disabled={!mayEdit}>
            Slip a line…
          </Button>
          <Button size="small" look="main" onClick={() => levelling.setOpen(true)} disabled={levelling.open}>
            {waiting ? 'See the proposal' : 'Level this week…'}
          </Button>
          <Button size="small" onClick={onIssue} disabled={model.isProposal}>
            Put on the floor…
          </Button>
        </>
      ) : null}
      {mayAgree && !mayPlan ? (
        <Button size="small" look={steamOver ? 'main' : 'plain'} onClick={onIssue} disabled={!steamOver}>
          {steamOver ? 'Agree to this week’s steam…' : 'Nothing to agree to'}
        </Button>
      ) : null}
    </>
  );
}
