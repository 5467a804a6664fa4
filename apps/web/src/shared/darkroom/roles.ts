import type { MemberRole } from '../api/types.js';

const order: readonly MemberRole[] = ['member', 'technician', 'manager'];

export const atLeast = (role: MemberRole, least: MemberRole): boolean =>
  order.indexOf(role) >= order.indexOf(least);
