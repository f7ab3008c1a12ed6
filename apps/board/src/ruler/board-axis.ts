/** The board's axis: days from today to the close of the window, in eight bins. */
export interface BoardBin {
  readonly name: string;
  /** First and last day that belong to it, both included. */
  readonly from: number;
  readonly to: number;
  /** Pixels at the full width of 1224 with the lane names. */
  readonly width: number;
}

/** The today line stands after the third bin. */
export const boardBins: readonly BoardBin[] = [
  { name: '3-months-late', from: Number.NEGATIVE_INFINITY, to: -92, width: 98 },
  { name: '1-to-3-months-late', from: -91, to: -29, width: 122 },
  { name: 'under-4-weeks-late', from: -28, to: -1, width: 138 },
  { name: '2-weeks-left', from: 0, to: 14, width: 150 },
  { name: '2-to-6-weeks-left', from: 15, to: 42, width: 150 },
  { name: '6-to-12-weeks', from: 43, to: 84, width: 146 },
  { name: '3-to-6-months', from: 85, to: 182, width: 132 },
  { name: 'longer', from: 183, to: Number.POSITIVE_INFINITY, width: 94 },
];

export const binsBeforeToday = 3;

/** The bin of a window that closes in so many whole days; negative when it has closed. */
export function boardBinOf(daysToClose: number): number {
  return boardBins.findIndex((bin) => daysToClose >= bin.from && daysToClose <= bin.to);
}
