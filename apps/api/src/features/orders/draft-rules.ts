import type { FieldProblem } from '../../platform/errors/problem.js';

interface AskedLine {
  id: string;
  supplierPackId: string;
  count: number;
}

/** What is wrong with the lines that somebody asks for at one supplier, field by field. */
export function draftComplaints(
  lines: readonly AskedLine[],
  sold: ReadonlyMap<string, { supplierId: string }>,
  supplierId: string,
): FieldProblem[] {
  return lines.flatMap(({ id, supplierPackId }, at) => {
    const before = lines.slice(0, at);
    if (before.some((line) => line.id === id)) {
      return [{ field: `lines.${at}.id`, message: 'This line is named twice.' }];
    }
    if (sold.get(supplierPackId)?.supplierId !== supplierId) {
      return [{ field: `lines.${at}.supplierPackId`, message: 'This supplier does not sell that.' }];
    }
    if (before.some((line) => line.supplierPackId === supplierPackId)) {
      return [{ field: `lines.${at}.supplierPackId`, message: 'This pack stands on a line above already.' }];
    }
    return [];
  });
}
