/** One line of a pair. Both figures are in the same unit: whole cents, whole minutes, sheets. */
export type LeafRow = {
  key: string;
  name: string;
  planned: number;
  built: number;
  /** Stands in place of the difference: "not started". */
  note?: string;
};

/** How wide a row's bars are, in percent of one leaf. */
export type LeafBars = {
  planned: number;
  /** Built within the plan. */
  built: number;
  /** Built beyond the plan, at the end of the bar. */
  over: number;
};

/** One scale for both leaves, so that the eye may compare across the spine. */
export function leafScale(rows: readonly LeafRow[]): number {
  return Math.max(1, ...rows.map(({ planned, built }) => Math.max(planned, built)));
}

/** @param scale the figure that fills a leaf; a negative figure has no bar */
export function leafBars({ planned, built }: LeafRow, scale: number): LeafBars {
  const share = (figure: number): number => (Math.max(0, figure) / scale) * 100;
  const over = Math.max(0, built - Math.max(0, planned));
  return { planned: share(planned), built: share(built - over), over: share(over) };
}

/** What a difference means when less is better: over the plan, under it, or neither. */
export function leafTone({ planned, built }: LeafRow): 'over' | 'under' | 'even' {
  if (built > planned) return 'over';
  return built < planned ? 'under' : 'even';
}
