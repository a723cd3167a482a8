import type { PracticeDto, PracticeRuleDto } from '@/contracts/practice';
import type { Db } from '@/db/client';
import type { Actor } from '../auth/actor';
import { authorize } from '../auth/permissions';
import { conflict, type HttpProblem } from '../http/problem';
import { namesOf } from '../people/people.repo';
import { plantRow } from '../weeks/plantParts.repo';
import {
  longestWaitsInForce,
  practiceRows,
  statedWaits,
  ventGroupsWithHeaders,
  type PracticeRow,
} from './practice.repo';

const GONE = 'somebody who has left';

type Groups = Awaited<ReturnType<typeof ventGroupsWithHeaders>>;

/** Why this person can't release the rule as it stands: done before, out of force, or entered by themselves. */
export function standing(actor: Actor, row: PracticeRow): HttpProblem | null {
  if (row.withdrawnAt) return conflict('RELEASE-WITHDRAWN', 'This rule was withdrawn. Enter it anew.');
  if (row.releasedBy) return conflict('RELEASE-DONE', 'This rule is released already.');
  if (row.enteredBy !== actor.personId) return null;
  return conflict(
    'RELEASE-OWN',
    'You entered this rule yourself: a second person with the quality role must release it.',
  );
}

function refusalFor(actor: Actor, row: PracticeRow): string | null {
  const authorized = authorize(actor, 'practice.release');
  return authorized.ok ? (standing(actor, row)?.message ?? null) : authorized.error.message;
}

function ruleDto(
  actor: Actor,
  row: PracticeRow,
  names: ReadonlyMap<string, string>,
  groups: ReadonlyMap<string, string>,
): PracticeRuleDto {
  const { id, kind, ventGroupId, values, source, releasedBy, releasedAt } = row;
  return {
    id,
    kind,
    ventGroup: ventGroupId === null ? null : { id: ventGroupId, name: groups.get(ventGroupId) ?? 'a retired group' },
    values,
    source,
    enteredBy: names.get(row.enteredBy) ?? GONE,
    enteredAt: row.createdAt.toISOString(),
    released: releasedBy && releasedAt ? { by: names.get(releasedBy) ?? GONE, at: releasedAt.toISOString() } : null,
    withdrawnAt: row.withdrawnAt?.toISOString() ?? null,
    releaseRefusal: refusalFor(actor, row),
  };
}

function groupDtos(groups: Groups): PracticeDto['ventGroups'] {
  return groups.map(({ group, headers }) => {
    const { id, name, plantId: _plant, position: _position, retiredAt: _retired, ...numbers } = group;
    return { id, name, numbers, headers };
  });
}

async function longerWaits(tx: Db, plantId: string): Promise<PracticeDto['longerWaits']> {
  const rule = await longestWaitsInForce(tx, plantId);
  if (!rule) return [];
  const stated = (await statedWaits(tx, plantId)).map(({ product, document, issue, values }) => {
    return { product, document: `${document} issue ${issue}`, minutes: values.longestWaitSinceClosingMinutes };
  });
  return stated.filter(({ minutes }) => minutes > rule.sinceClosingMin);
}

/** The plant's practice rules for a reader; null where there is no such plant. */
export async function practiceDto(tx: Db, actor: Actor): Promise<PracticeDto | null> {
  const plant = await plantRow(tx, actor.plantId);
  if (!plant) return null;
  const rows = await practiceRows(tx, actor.plantId);
  const groups = await ventGroupsWithHeaders(tx, actor.plantId);
  const people = rows.flatMap(({ enteredBy, releasedBy }) => (releasedBy ? [enteredBy, releasedBy] : [enteredBy]));
  const names = await namesOf(tx, people);
  const groupNames = new Map(groups.map(({ group }) => [group.id, group.name]));
  return {
    timeZone: plant.timeZone,
    rules: rows.map((row) => ruleDto(actor, row, names, groupNames)),
    ventGroups: groupDtos(groups),
    longerWaits: await longerWaits(tx, actor.plantId),
  };
}
