/** What stands in a list's order columns where there is no number or date yet, so that drafts come after the rest. */
export const NO_NUMBER_YET = 2_000_000_000;
export const NO_DATE_YET = '9999-12-31';
