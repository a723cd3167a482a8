const THIN = '\u2009';

/** Six significant digits, thin spaces in thousands, no trailing zeros: a working shows all that there is to check. */
export function fullDigits(value: number): string {
  if (value === 0) return '0';
  const text = Math.abs(value) >= 1e7 || Math.abs(value) < 1e-4 ? value.toExponential(5) : plain(value);
  return text.replace(/^-/, '\u2212');
}

function plain(value: number): string {
  const [whole = '0', fraction] = String(Number(value.toPrecision(6))).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+(?!\d))/g, THIN);
  return fraction === undefined ? grouped : `${grouped}.${fraction}`;
}

/** Names of phases as the floor and the handbook say them. */
export const PHASE_NAMES: Readonly<Record<string, string>> = {
  warmUp: 'warm-up',
  run: 'run',
  idle: 'idling',
  heatUp: 'heating up',
  boilOff: 'boiling off',
  hold: 'simmering',
  vent: 'vent',
  comeUp: 'come-up',
  process: 'process',
  cool: 'cooling',
  rinse: 'rinse',
  wash: 'wash',
};
