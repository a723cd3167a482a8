import { useState } from 'react';
import type { MeDto } from '../../contracts/account';
import { QueryProvider } from '../query/client';
import { Notice } from '../ui/Notice';
import { Board } from './Board';
import './board.css';
import { readWeekBlock } from './dataBlock';

interface Props {
  readonly me: MeDto;
}

/** The week board as an island; the page carries the week beside it. */
export default function WeekBoard({ me }: Props) {
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
      <Board me={me} initial={week} />
    </QueryProvider>
  );
}
