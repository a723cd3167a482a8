const ALWAYS: Readonly<Record<string, string>> = {
  'x-content-type-options': 'nosniff',
  'x-frame-options': 'DENY',
  'referrer-policy': 'same-origin',
  'cross-origin-resource-policy': 'same-origin',
  'permissions-policy': 'camera=(), geolocation=(), microphone=(), payment=(), usb=()',
};

/** Browsers heed these over https only, and complain of them elsewhere. */
const OVER_HTTPS: Readonly<Record<string, string>> = {
  'strict-transport-security': 'max-age=31536000',
  'cross-origin-opener-policy': 'same-origin',
};

const DATA_POLICY = "default-src 'none'; frame-ancestors 'none'";

const isHtml = (headers: Headers): boolean => headers.get('content-type')?.startsWith('text/html') ?? false;

/**
 * Sets what every answer carries. Pages keep the framework's policy with its hashes; drawn lengths are style
 * attributes, which get leave of their own. What is not a page may load nothing.
 */
export function setSecurityHeaders(headers: Headers, appUrl = process.env.APP_URL): void {
  const carried = appUrl?.startsWith('https:') ? { ...ALWAYS, ...OVER_HTTPS } : ALWAYS;
  for (const [name, value] of Object.entries(carried)) headers.set(name, value);
  const policy = headers.get('content-security-policy');
  // A page that gives way to another, such as the one for what is not there, passes here twice.
  if (policy?.includes('style-src-attr')) return;
  if (policy) {
    const closed = policy.replace(/;\s*$/, '');
    headers.set('content-security-policy', `${closed}; style-src-attr 'unsafe-inline'`);
  } else if (!isHtml(headers)) headers.set('content-security-policy', DATA_POLICY);
  if (isHtml(headers) && !headers.has('cache-control')) headers.set('cache-control', 'private, no-cache');
}
