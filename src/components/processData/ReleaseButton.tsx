import { QueryClient, QueryClientProvider, useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import type { ProcessDataDto } from '@/contracts/processData';
import { api, messageOf } from '../query/api';
import { Button } from '../ui/Button';
import { Dialog } from '../ui/Dialog';
import { Notice } from '../ui/Notice';

interface Props {
  readonly id: string;
  /** 'TH-TP-12 issue 3' */
  readonly what: string;
  readonly productName: string;
}

/** Releases one document's values after a second look; the page is then read anew. */
function Release({ id, what, productName }: Props) {
  const [open, setOpen] = useState(false);
  const release = useMutation({
    mutationFn: () => api<ProcessDataDto>(`/api/process-data/${encodeURIComponent(id)}/release`, { method: 'POST' }),
    onSuccess: () => location.reload(),
  });
  return (
    <>
      <Button look="main" size="small" onClick={() => setOpen(true)} aria-label={`Release ${what}`}>
        Release…
      </Button>
      <Dialog
        open={open}
        title={`Release ${what}?`}
        onClose={() => setOpen(false)}
        actions={
          <>
            <Button onClick={() => setOpen(false)}>Not yet</Button>
            <Button look="main" busy={release.isPending || release.isSuccess} onClick={() => release.mutate()}>
              Release
            </Button>
          </>
        }
      >
        <p>
          {productName} can then be planned with it. You confirm that the values are those of the document, as its
          process authority gave them.
        </p>
        {release.error ? (
          <Notice look="over" live className="mt-3">
            {messageOf(release.error)}
          </Notice>
        ) : null}
      </Dialog>
    </>
  );
}

/** The release button as an island. */
export function ReleaseButton(props: Props) {
  const [client] = useState(() => new QueryClient());
  return (
    <QueryClientProvider client={client}>
      <Release {...props} />
    </QueryClientProvider>
  );
}
