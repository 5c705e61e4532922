/** How one column of a list is headed, ordered and written. */
export type Column<Row> = {
  key: string;
  header: string;
  /** The server's sort key, when the list can be ordered by this column. */
  sort?: string;
  /** Figures stand at the end. */
  align?: 'start' | 'end';
  /**
   * The cell's text; a `bmCell` template of the same key takes its place. A cell whose text is empty is left out of a
   * narrow row.
   */
  text?: (row: Row) => string;
  /** Where it stands in the two-line row of a narrow place; without it the first is the title, the others the second line. */
  phone?: 'title' | 'side' | 'line' | 'hidden';
  /** Never broken over two lines: a phone number, a date. Figures at the end never are. */
  whole?: boolean;
  width?: string;
};
