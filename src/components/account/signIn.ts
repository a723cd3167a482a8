import type { ProblemDto } from '@/contracts/problem';

const OFFLINE: ProblemDto = {
  code: 'NO-CONNECTION',
  message: 'No connection to Steadmain. Check the network, then try again.',
};

async function postSession(form: HTMLFormElement): Promise<ProblemDto | null> {
  const data = new FormData(form);
  const body = JSON.stringify({ email: String(data.get('email') ?? '').trim(), password: data.get('password') });
  const headers = { 'content-type': 'application/json', accept: 'application/json' };
  try {
    const response = await fetch('/api/session', { method: 'POST', headers, body });
    return response.ok ? null : ((await response.json()) as ProblemDto);
  } catch {
    return OFFLINE;
  }
}

function showProblem(form: HTMLFormElement, problem: ProblemDto | null): void {
  const fields = new Map(problem?.fields?.map(({ path, message }) => [path, message]));
  for (const input of form.querySelectorAll<HTMLInputElement>('input')) {
    const message = fields.get(input.name);
    const note = document.getElementById(`${input.name}-note`);
    if (note) note.textContent = message ?? '';
    input.toggleAttribute('aria-invalid', message !== undefined);
  }
  const summary = form.querySelector<HTMLElement>('[data-problem]');
  if (!summary) return;
  summary.textContent = problem && fields.size === 0 ? problem.message : '';
  form.querySelector<HTMLInputElement>('[aria-invalid]')?.focus();
}

/** Lets the sign-in form post itself as JSON, say what is wrong beside the field, and go on to its `data-next`. */
export function followSignIn(form: HTMLFormElement): void {
  const button = form.querySelector<HTMLButtonElement>('button[type=submit]');
  form.addEventListener('submit', (event) => {
    event.preventDefault();
    if (button?.ariaBusy === 'true') return;
    if (button) button.ariaBusy = 'true';
    void postSession(form).then((problem) => {
      if (!problem) return location.assign(form.dataset.next ?? '/');
      if (button) button.ariaBusy = 'false';
      showProblem(form, problem);
    });
  });
}
