import { useState } from 'react';
import type { MeDto } from '../../contracts/account';
import type { UnitSystem } from '../../core/quantity/display';
import { QueryProvider } from '../query/client';
import { Notice } from '../ui/Notice';
import { UnitsProvider } from '../ui/units';
import { Board } from './Board';
import './board.css';
import { readWeekBlock } from './dataBlock';

interface Props {
  readonly me: MeDto;
  readonly units: UnitSystem;
}

/** The week board as an island; the page carries the week beside it. */
export default function WeekBoard({ me, units }: Props) {
  const [week] = useState(readWeekBlock);
  if (!week) {
    return (
      <div className="board p-6">
        <Notice look="over" title="The week could not be read." live>
          Reload the page. What was saved is safe.
        </Notice>
      </div>
    );
  }
  return (
    <QueryProvider>
      <UnitsProvider system={units}>
        <Board me={me} initial={week} />
      </UnitsProvider>
    </QueryProvider>
  );
}
