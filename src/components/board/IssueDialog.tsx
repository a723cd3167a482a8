import { useState, type ReactNode } from 'react';
import type { Breach } from '../../core/schedule/breach';
import { breachSentence } from '../../core/schedule/sentences';
import { Button } from '../ui/Button';
import { Dialog } from '../ui/Dialog';
import { TextField } from '../ui/Field';
import { Notice } from '../ui/Notice';
import { spanText } from '../time';
import { useUnits } from '../ui/units';
import { standingOf, type Standing } from './standing';
import type { BoardModel } from './useBoard';
import { useIssue } from './useIssue';
import { weekWords } from './weekWords';

interface Props {
  readonly model: BoardModel;
  readonly onClose: () => void;
  readonly onGo: (breach: Breach) => void;
}

/** What stands between the plan and the floor, who can do what about it, and putting it there. */
export function IssueDialog({ model, onClose, onGo }: Props) {
  const units = useUnits();
  const { dto, evaluator, saves, mayPlan, mayAgree, tell } = model;
  const standing = standingOf(evaluator.evaluation.breaches, dto.week.activities, dto.agreement, dto.planRevision);
  const [comment, setComment] = useState('');
  const issuing = useIssue(dto, (issue) => {
    tell({ look: 'good', title: `Issue ${issue.number} is on the floor.`, lines: ['The shift sheets show it now.'] });
    onClose();
  });
  const name = weekWords(dto).title.toLowerCase();
  const words = comment.trim();
  const waits = saves.pending.length > 0;
  const canAgree = mayAgree && standing.process.length === 0 && standing.steam.length > 0 && !standing.agreed;
  const canIssue = mayPlan && standing.mayGo;
  const go = (breach: Breach): void => {
    onClose();
    onGo(breach);
  };
  return (
    <Dialog
      open
      wide
      title={
        mayPlan ? `Put ${name} on the floor as issue ${(dto.issue?.number ?? 0) + 1}` : `Agree to the steam of ${name}`
      }
      onClose={onClose}
      actions={
        <>
          <Button onClick={onClose}>{canAgree || canIssue ? 'Not now' : 'Close'}</Button>
          {canAgree ? (
            <Button
              look={canIssue ? 'plain' : 'main'}
              busy={issuing.busy}
              disabled={words === '' || waits}
              onClick={() => issuing.agree(words)}
            >
              Agree to this
            </Button>
          ) : null}
          {canIssue ? (
            <Button
              look="main"
              busy={issuing.busy}
              disabled={words === '' || waits}
              onClick={() => issuing.issue(words)}
            >
              Put on the floor
            </Button>
          ) : null}
        </>
      }
    >
      <div className="flex flex-col gap-4">
        {issuing.problem ? <Notice look="over" title={units.message(issuing.problem)} live /> : null}
        <ProcessPart standing={standing} model={model} onGo={go} />
        <SteamPart standing={standing} model={model} onGo={go} />
        {standing.mayGo && standing.steam.length === 0 ? (
          <Notice look="good" title="Nothing stands in the way.">
            The plan keeps every process limit and every steam limit that is judged.
          </Notice>
        ) : null}
        {canAgree || canIssue ? (
          <TextField
            label={canAgree && !canIssue ? 'Why this is all right' : 'What is new, for those on the floor'}
            value={comment}
            maxLength={2000}
            onChange={(event) => setComment(event.target.value)}
            hint={words === '' ? 'A few words are needed.' : undefined}
          />
        ) : null}
      </div>
    </Dialog>
  );
}

interface PartProps {
  readonly standing: Standing;
  readonly model: BoardModel;
  readonly onGo: (breach: Breach) => void;
}

function ProcessPart({ standing, model, onGo }: PartProps) {
  if (standing.process.length === 0) return null;
  return (
    <Notice look="over" title={`${standing.process.length} process limits are passed. Nobody can agree to these.`}>
      <p>Put them right on the board first.</p>
      <Lines breaches={standing.process} {...{ model, onGo }} />
    </Notice>
  );
}

function SteamPart({ standing, model, onGo }: PartProps) {
  const units = useUnits();
  const { steam, agreed } = standing;
  if (steam.length === 0) return null;
  const { agreement } = model.dto;
  if (agreed && agreement) {
    return (
      <Notice
        look="good"
        title={`${agreement.by} has agreed to this plan's steam, ${model.clock.instantDayTime(agreement.at)}.`}
      >
        {agreement.comment}
      </Notice>
    );
  }
  const { over } = model.evaluator.evaluation;
  const title =
    over.kg > 0
      ? `Over the steam limit by ${units.mass(over.kg)}, ${spanText(over.minutes)}.`
      : `${steam.length} steps are too steep for the boilers in fire.`;
  return (
    <Notice look="over" title={title}>
      <p>{whoAgrees(model, standing)}</p>
      <Lines breaches={steam} {...{ model, onGo }} />
    </Notice>
  );
}

function whoAgrees(model: BoardModel, standing: Standing): ReactNode {
  if (standing.process.length > 0) return 'A utilities lead can agree to steam once the process limits are kept.';
  if (model.mayAgree) return 'You can agree to this plan as it is. A later change of the plan needs a new agreement.';
  return 'Level it under the limit, or ask a utilities lead to agree to it as it is.';
}

const FEW = 5;

function Lines({ breaches, model, onGo }: Omit<PartProps, 'standing'> & { readonly breaches: readonly Breach[] }) {
  return (
    <ul className="mt-2 flex flex-col gap-0.5">
      {breaches.slice(0, FEW).map((breach) => (
        <li key={breach.id}>
          <button type="button" className="link text-left" onClick={() => onGo(breach)}>
            {breachSentence(breach, model.names, model.clock.dayTime).title}
          </button>
        </li>
      ))}
      {breaches.length > FEW ? <li>and {breaches.length - FEW} more</li> : null}
    </ul>
  );
}
