/** A piece of a formula: plain, or set low after what it belongs to. */
export interface FormulaPiece {
  readonly text: string;
  readonly isLow: boolean;
}

/** Parts 'Q = m · c_p · (T_2 − T_1)' into plain text and indices; an index runs over letters and digits. */
export function formulaPieces(formula: string): FormulaPiece[] {
  return formula
    .split(/(_[\p{L}\p{N}]+)/u)
    .filter((part) => part !== '')
    .map((part) =>
      /^_[\p{L}\p{N}]/u.test(part) ? { text: part.slice(1), isLow: true } : { text: part, isLow: false },
    );
}
