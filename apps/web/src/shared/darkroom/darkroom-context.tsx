import { createContext, useContext } from 'react';
import type { Darkroom, MemberRole } from '../api/types.js';
import { atLeast } from './roles.js';

/** The darkroom of the page, under the name that its address uses. */
export interface CurrentDarkroom extends Darkroom {
  /** As the address names it: what paths and requests are made with. */
  address: string;
}

const Context = createContext<CurrentDarkroom | null>(null);
export const DarkroomProvider = Context.Provider;

/** Throws outside a darkroom's pages: there is no darkroom to fall back on. */
export function useDarkroom(): CurrentDarkroom {
  const darkroom = useContext(Context);
  if (!darkroom) throw new Error('this part of the page belongs inside a darkroom');
  return darkroom;
}

export const useMay = (least: MemberRole): boolean => atLeast(useDarkroom().me.role, least);
