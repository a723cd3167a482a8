import { eq } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { ProcessDataDto, ProcessDataListDto } from '@/contracts/processData';
import { db } from '@/db/client';
import { processData, record } from '@/db/schema/index';
import { GET } from '@/pages/api/process-data/index';
import { POST } from '@/pages/api/process-data/[id]/release';
import { callApi, outcome } from '../support/api';
import { nameOf, openWorld, sessionOf } from '../support/world';

beforeAll(openWorld);
beforeEach(async () => {
  await db.update(processData).set({ releasedBy: null, releasedAt: null, withdrawnAt: null });
  await db.delete(record);
});

const second = 'north-qualityLead-2';
const release = async (personId: string, id = 'north-process') =>
  callApi(POST, { session: await sessionOf(personId), method: 'POST', params: { id } });
const list = async (personId: string) =>
  (await (await callApi(GET, { session: await sessionOf(personId) })).json()) as ProcessDataListDto;
const row = async () => (await db.select().from(processData).where(eq(processData.id, 'north-process')))[0];

describe('process data', () => {
  it('is listed to every role of its plant only, with what keeps the reader from releasing it', async () => {
    const { items, timeZone } = await list('north-planner');
    expect(timeZone).toBe('Europe/London');
    expect(items).toMatchObject([
      { id: 'north-process', productName: 'Leek soup', document: 'SP-12', issue: '3', released: null },
    ]);
    expect(items[0]?.enteredBy).toBe(nameOf('north-qualityLead'));
    expect(items[0]?.releaseRefusal).toContain('quality lead');
    expect((await list('north-qualityLead')).items[0]?.releaseRefusal).toContain('yourself');
    expect((await list(second)).items[0]?.releaseRefusal).toBeNull();
  });

  it('is released by a second person, with name and time, in the record', async () => {
    const response = await release(second);
    expect(response.status).toBe(200);
    const dto = (await response.json()) as ProcessDataDto;
    expect(dto.released?.by).toBe(nameOf(second));
    expect(dto.releaseRefusal).toContain('already');
    expect(await row()).toMatchObject({ releasedBy: second, releasedAt: expect.any(Date) });
    const kept = await db.select().from(record);
    expect(kept).toMatchObject([{ action: 'processData.release', subject: 'north-process', authorId: second }]);
  });

  it('is released once, whoever else tries at the same time', async () => {
    const responses = await Promise.all([release(second), release(second)]);
    expect(responses.map((response) => response.status).sort()).toEqual([200, 409]);
    expect(await db.$count(record)).toBe(1);
  });

  it.each([
    ['by whoever entered it', 'north-qualityLead', 'north-process', 409, 'RELEASE-OWN'],
    ['by another role', 'north-planner', 'north-process', 403, 'ROLE'],
    ['of another plant', second, 'south-process', 404, 'NOT-FOUND'],
    ['that there is not', second, 'no-process', 404, 'NOT-FOUND'],
  ])('is not released %s', async (_, personId, id, status, code) => {
    expect(await outcome(await release(personId, id))).toEqual({ status, code });
    expect(await db.$count(processData, eq(processData.releasedBy, personId))).toBe(0);
    expect(await db.$count(record)).toBe(0);
  });

  it('is not released after it was withdrawn', async () => {
    await db.update(processData).set({ withdrawnAt: new Date(0) });
    expect(await outcome(await release(second))).toEqual({ status: 409, code: 'RELEASE-WITHDRAWN' });
  });
});
