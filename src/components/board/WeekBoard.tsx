import type { MeDto } from '../../contracts/account';
import type { WeekDto } from '../../contracts/week';
import { QueryProvider } from '../query/client';
import { Board } from './Board';
import './board.css';

interface Props {
  readonly me: MeDto;
  readonly initial: WeekDto;
}

/** The week board as an island. */
export default function WeekBoard(props: Props) {
  return (
    <QueryProvider>
      <Board {...props} />
    </QueryProvider>
  );
}
