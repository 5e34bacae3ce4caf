/** Most series and points of a dataset document. Apart from the checks, since pages need these without them. */
export const MOST_SERIES = 200;
export const MOST_POINTS = 20_000;
