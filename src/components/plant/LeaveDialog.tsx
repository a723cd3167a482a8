import { Button } from '../ui/Button';
import { Dialog } from '../ui/Dialog';

interface Props {
  readonly open: boolean;
  readonly onStay: () => void;
  readonly onLeave: () => void;
}

/** Asked before what is typed and not saved is lost. */
export function LeaveDialog({ open, onStay, onLeave }: Props) {
  return (
    <Dialog
      {...{ open }}
      title="Leave without saving?"
      onClose={onStay}
      actions={
        <>
          <Button look="over" onClick={onLeave}>
            Leave it
          </Button>
          <Button look="main" onClick={onStay}>
            Stay
          </Button>
        </>
      }
    >
      <p>What you have typed is not saved yet.</p>
    </Dialog>
  );
}
