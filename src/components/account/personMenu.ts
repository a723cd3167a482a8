const YEAR_S = 31_536_000;

/** Shows a theme and keeps it on this device. */
export function keepTheme(theme: string): void {
  document.documentElement.dataset.theme = theme;
  document.cookie = `theme=${theme}; path=/; max-age=${YEAR_S}; samesite=lax`;
}

/** Keeps a theme for the account too, so that a new device begins with it; this device has it already. */
function keepForAccount(theme: string): void {
  void post('/api/settings/own', { theme }).catch(() => undefined);
}

const post = (path: string, body: unknown): Promise<Response> =>
  fetch(path, {
    method: 'POST',
    headers: { accept: 'application/json', 'content-type': 'application/json' },
    body: JSON.stringify(body),
  });

async function workAt(plantId: string): Promise<void> {
  const answer = await post('/api/session/plant', { plantId }).catch(() => null);
  if (answer?.ok) location.assign('/');
  else location.reload();
}

async function signOut(to: string): Promise<void> {
  try {
    await fetch('/api/session', { method: 'DELETE', headers: { accept: 'application/json' } });
  } finally {
    location.assign(to);
  }
}

const IDLE_MS = 15 * 60_000;
const TELL_EVERY_MS = 60_000;

/** Keeps a tablet's session open while hands are on it, and signs out when none has been for a quarter of an hour. */
function followTouch(): void {
  let told = Date.now();
  let idle = setTimeout(leave, IDLE_MS);
  function leave(): void {
    void signOut('/tablet');
  }
  const touched = (): void => {
    clearTimeout(idle);
    idle = setTimeout(leave, IDLE_MS);
    if (Date.now() - told < TELL_EVERY_MS) return;
    told = Date.now();
    void post('/api/tablet/touch', {})
      .then((answer) => (answer.status === 401 ? location.assign('/tablet') : undefined))
      .catch(() => undefined);
  };
  for (const kind of ['pointerdown', 'keydown', 'scroll'] as const) {
    window.addEventListener(kind, touched, { passive: true, capture: true });
  }
}

/** Lets the person menu of the header keep the theme, go to another plant and sign out. */
export function followPersonMenu(): void {
  const menu = document.getElementById('person-menu');
  menu?.addEventListener('change', (event) => {
    const input = event.target;
    if (input instanceof HTMLInputElement && input.name === 'theme') {
      keepTheme(input.value);
      keepForAccount(input.value);
    }
  });
  menu?.querySelectorAll<HTMLElement>('[data-plant]').forEach((button) => {
    button.addEventListener('click', () => void workAt(button.dataset.plant ?? ''));
  });
  const isTablet = menu?.dataset.tablet !== undefined;
  menu
    ?.querySelector('[data-sign-out]')
    ?.addEventListener('click', () => void signOut(isTablet ? '/tablet' : '/sign-in'));
  if (isTablet) followTouch();
}
