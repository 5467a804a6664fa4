/** How many rows of one sort were checked, and a sentence for each difference. */
export interface Found {
  checked: number;
  differences: string[];
}

/** A stored value in a sentence. */
export const show = (value: unknown): string =>
  value === undefined || value === null ? 'nothing' : JSON.stringify(value);
