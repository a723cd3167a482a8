import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import type { SavedThingDto, ThingKind } from '../../contracts/plantLibrary';
import { api, ApiProblem, messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { Dialog } from '../ui/Dialog';
import { Notice } from '../ui/Notice';

interface Props {
  readonly kind: ThingKind;
  readonly id: string;
  readonly name: string;
  readonly onRetired: (saved: SavedThingDto) => void;
}

function usesOf(error: unknown): readonly string[] {
  const body = error instanceof ApiProblem ? error.body : null;
  if (typeof body !== 'object' || body === null || !('uses' in body) || !Array.isArray(body.uses)) return [];
  return body.uses.filter((use): use is string => typeof use === 'string');
}

function Refusal({ error }: { readonly error: unknown }) {
  const uses = usesOf(error);
  if (uses.length === 0) {
    return (
      <Notice look="over" live className="mt-3">
        {messageOf(error)}
      </Notice>
    );
  }
  return (
    <Notice look="over" live className="mt-3" title="It is still used by">
      <ul className="list-disc pl-4">
        {uses.map((use) => (
          <li key={use}>{use}</li>
        ))}
      </ul>
    </Notice>
  );
}

/** Takes a thing out of use after a second look; says what still uses it where it can't. */
export function RetireButton({ kind, id, name, onRetired }: Props) {
  const [open, setOpen] = useState(false);
  const retire = useMutation({
    mutationFn: () => api<SavedThingDto>(`/api/plant/${kind}/${encodeURIComponent(id)}/retire`, { method: 'POST' }),
    onSuccess: onRetired,
  });
  const close = (): void => {
    setOpen(false);
    retire.reset();
  };
  return (
    <>
      <Button look="over" onClick={() => setOpen(true)}>
        Retire…
      </Button>
      <Dialog
        open={open}
        title={`Retire ${name}?`}
        onClose={close}
        actions={
          <>
            <Button onClick={close}>Keep it</Button>
            <Button look="over" busy={retire.isPending} onClick={() => retire.mutate()}>
              Retire
            </Button>
          </>
        }
      >
        <p>It goes from the plant of this week and of those to come; weeks that have ended keep it.</p>
        {retire.error ? <Refusal error={retire.error} /> : null}
      </Dialog>
    </>
  );
}
