import { db } from '@/db/client';
import * as t from '@/db/schema/index';

/** A line of the plant with two retorts and a kettle, for tests of its library. */
export async function insertUnits(plantId: string): Promise<void> {
  const lineId = `${plantId}-line`;
  await db.insert(t.lines).values({ id: lineId, plantId, name: 'Line 1', position: 0 });
  const unit = (name: string, kind: 'retort' | 'kettle' | 'filler', headerId: string | null, position: number) => {
    const words = `${name[0]?.toUpperCase()}${name.slice(1)}`.replace('-', ' ');
    return { id: `${plantId}-${name}`, plantId, lineId, name: words, kind, headerId, position };
  };
  await db
    .insert(t.units)
    .values([
      unit('retort-1', 'retort', `${plantId}-main`, 0),
      unit('retort-2', 'retort', `${plantId}-main`, 1),
      unit('kettle-1', 'kettle', `${plantId}-low`, 2),
      unit('filler-1', 'filler', null, 3),
    ]);
}
