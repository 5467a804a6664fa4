/** The most pieces of one load. */
export const MOST = 99;
