let anchor: { readonly text: string; readonly offsetMs: number } | null = null;

function offsetMs(text: string): number {
  if (anchor?.text !== text) {
    const instant = Date.parse(text);
    if (Number.isNaN(instant)) throw new Error(`STEADMAIN_NOW is not an ISO instant: ${text}`);
    anchor = { text, offsetMs: instant - Date.now() };
  }
  return anchor.offsetMs;
}

/** The server's one clock. STEADMAIN_NOW (an ISO instant) sets it; time runs on from there. */
export function now(): Date {
  const text = process.env.STEADMAIN_NOW;
  return new Date(Date.now() + (text ? offsetMs(text) : 0));
}
