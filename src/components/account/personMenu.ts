const YEAR_S = 31_536_000;

function keepTheme(theme: string): void {
  document.documentElement.dataset.theme = theme;
  document.cookie = `theme=${theme}; path=/; max-age=${YEAR_S}; samesite=lax`;
}

async function signOut(): Promise<void> {
  try {
    await fetch('/api/session', { method: 'DELETE', headers: { accept: 'application/json' } });
  } finally {
    location.assign('/sign-in');
  }
}

/** Lets the person menu of the header keep the theme and sign out. */
export function followPersonMenu(): void {
  const menu = document.getElementById('person-menu');
  menu?.addEventListener('change', (event) => {
    const input = event.target;
    if (input instanceof HTMLInputElement && input.name === 'theme') keepTheme(input.value);
  });
  menu?.querySelector('[data-sign-out]')?.addEventListener('click', () => void signOut());
}
