/** What is kept of one darkroom. An action names those that it touches. */
export type Kept =
  | 'bottles'
  | 'bottle'
  | 'chemistries'
  | 'log'
  | 'needs-you'
  | 'orders'
  | 'order'
  | 'people'
  | 'settings'
  | 'shelf'
  | 'suppliers';

export const meKey = ['me'] as const;
export const keptKey = (darkroom: string, kept: Kept, ...rest: string[]): string[] => [
  'darkroom',
  darkroom,
  kept,
  ...rest,
];
