import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { AgreementDto, IssueDto, WeekDto } from '../../contracts/week';
import { api, messageOf } from '../query/api';
import { weekKey } from './useWeek';

export interface Issuing {
  readonly busy: boolean;
  readonly problem: string | null;
  readonly agree: (comment: string) => void;
  readonly issue: (comment: string) => void;
}

/** Agreeing to steam over the limit, and putting an issue of the plan on the floor. */
export function useIssue(dto: WeekDto, onIssued: (issue: IssueDto) => void): Issuing {
  const client = useQueryClient();
  const key = weekKey(dto.weekStart);
  const path = `/api/weeks/${dto.weekStart}`;
  const body = (comment: string) => ({ planRevision: dto.planRevision, comment });
  const agree = useMutation({
    mutationFn: (comment: string) => api<AgreementDto>(`${path}/agreements`, { method: 'POST', body: body(comment) }),
    onSuccess: (agreement) => client.setQueryData<WeekDto>(key, (d) => d && { ...d, agreement }),
    onSettled: () => client.invalidateQueries({ queryKey: key }),
  });
  const issue = useMutation({
    mutationFn: (comment: string) => api<IssueDto>(`${path}/issues`, { method: 'POST', body: body(comment) }),
    onSuccess: (made) => {
      client.setQueryData<WeekDto>(key, (d) => d && { ...d, issue: made });
      onIssued(made);
    },
    onSettled: () => client.invalidateQueries({ queryKey: key }),
  });
  const error = issue.error ?? agree.error;
  return {
    busy: agree.isPending || issue.isPending,
    problem: error ? messageOf(error) : null,
    agree: agree.mutate,
    issue: issue.mutate,
  };
}
