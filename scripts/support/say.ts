const beganAt = Number(process.env['STEADMAIN_BEGAN'] ?? 0) * 1000 || Date.now();

/** Prints one line of progress behind the whole seconds since the command began. */
export function say(line: string): void {
  const seconds = Math.floor((Date.now() - beganAt) / 1000);
  console.log(`${String(seconds).padStart(4)} s  ${line}`);
}
