import type { ProblemDto } from '@/contracts/problem';

const OFFLINE: ProblemDto = {
  code: 'NO-CONNECTION',
  message: 'No connection to Steadmain. Check the network, then try again.',
};

type Answer = { readonly problem: ProblemDto } | { readonly next: string | null };

/** A form's fields as JSON: text trimmed but for passwords, and what is empty and not required left out. */
function bodyOf(form: HTMLFormElement): Record<string, string> {
  const body: Record<string, string> = {};
  for (const [name, value] of new FormData(form)) {
    if (typeof value !== 'string') continue;
    const isSecret = form.querySelector(`[name="${name}"]`)?.getAttribute('type') === 'password';
    body[name] = isSecret ? value : value.trim();
  }
  return body;
}

async function post(form: HTMLFormElement): Promise<Answer> {
  const headers = { 'content-type': 'application/json', accept: 'application/json' };
  try {
    const response = await fetch(form.action, { method: 'POST', headers, body: JSON.stringify(bodyOf(form)) });
    const text = await response.text();
    const answer = (text === '' ? {} : JSON.parse(text)) as ProblemDto & { next?: string };
    return response.ok ? { next: answer.next ?? null } : { problem: answer };
  } catch {
    return { problem: OFFLINE };
  }
}

function showProblem(form: HTMLFormElement, problem: ProblemDto | null): void {
  const fields = new Map(problem?.fields?.map(({ path, message }) => [path, message]));
  let shown = 0;
  for (const input of form.querySelectorAll<HTMLInputElement | HTMLSelectElement>('input, select')) {
    const message = fields.get(input.name);
    const note = document.getElementById(`${input.name}-note`);
    if (note) {
      note.dataset.hint ??= note.textContent ?? '';
      note.textContent = message ?? note.dataset.hint;
      note.classList.toggle('text-over', message !== undefined);
      if (message !== undefined) shown++;
    }
    input.toggleAttribute('aria-invalid', message !== undefined);
  }
  const summary = form.querySelector<HTMLElement>('[data-problem]');
  if (summary) summary.textContent = problem && shown === 0 ? problem.message : '';
  form.querySelector<HTMLElement>('[aria-invalid]')?.focus();
}

/** Puts what stands in `[data-done]` of the page in the place of the form. */
function showDone(form: HTMLFormElement): void {
  const done = document.querySelector<HTMLElement>('[data-done]');
  form.hidden = true;
  if (!done) return;
  done.hidden = false;
  done.focus();
}

/**
 * Lets a form post itself as JSON to its action, say what is wrong beside the field, and go on: to its `data-next`, to
 * the page that the answer names, or to what the page says when it is done.
 */
export function followForm(form: HTMLFormElement): void {
  const button = form.querySelector<HTMLButtonElement>('button[type=submit]');
  form.addEventListener('submit', (event) => {
    event.preventDefault();
    if (button?.ariaBusy === 'true') return;
    if (button) button.ariaBusy = 'true';
    void post(form).then((answer) => {
      const next = 'next' in answer ? (form.dataset.next ?? answer.next) : null;
      if (next !== null) return location.assign(next);
      if (button) button.ariaBusy = 'false';
      if ('problem' in answer) showProblem(form, answer.problem);
      else showDone(form);
    });
  });
}
