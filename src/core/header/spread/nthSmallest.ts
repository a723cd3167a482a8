/** The value that has `rank` values before it in ascending order, 0 the least; `values` are put in another order. */
export function nthSmallest(values: Float64Array, rank: number): number {
  let low = 0;
  let high = values.length - 1;
  while (low < high) {
    const pivot = values[(low + high) >> 1] as number;
    let i = low;
    let j = high;
    while (i <= j) {
      while ((values[i] as number) < pivot) i++;
      while ((values[j] as number) > pivot) j--;
      if (i > j) break;
      [values[i], values[j]] = [values[j] as number, values[i] as number];
      i++;
      j--;
    }
    if (rank <= j) high = j;
    else if (rank >= i) low = i;
    else return values[rank] as number;
  }
  return values[rank] as number;
}
