/** Keeps the columns of a run under one another in every table; many runs scroll within their table. */
export const tableWidth = (runs: number) => ({ minWidth: `${5 + runs * 8.5}rem` });
