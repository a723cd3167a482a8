/** Temperatures, times and waits of a scheduled process, as its document states them. */
export interface ProcessValuesDto {
  readonly processC: number;
  readonly processMinutes: number;
  readonly ventMinutes: number;
  readonly ventToC: number;
  readonly comeUpMinutes: number;
  readonly leastInitialC: number;
  readonly longestWaitSinceClosingMinutes: number;
  readonly longestWaitForInitialTemperatureMinutes: number | null;
}

/** Thermal-process data of a product, as the quality lead sees it. */
export interface ProcessDataDto {
  readonly id: string;
  readonly productId: string;
  readonly productName: string;
  readonly document: string;
  readonly issue: string;
  readonly values: ProcessValuesDto;
  readonly enteredBy: string;
  /** ISO instant. */
  readonly enteredAt: string;
  readonly released: { readonly by: string; readonly at: string } | null;
  /** ISO instant; null while in force. */
  readonly withdrawnAt: string | null;
  /** Why the person asking can't release it; null where they can. */
  readonly releaseRefusal: string | null;
}

/** GET /api/process-data and POST /api/process-data/:id/release (which gives the one released). */
export interface ProcessDataListDto {
  readonly timeZone: string;
  readonly items: readonly ProcessDataDto[];
}
