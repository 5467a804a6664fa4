import type { ChemistryDocument } from '../document.js';
import { rapidFixer } from './rapid-fixer.js';
import { stopBathSb5 } from './stop-bath-sb5.js';
import { wettingAgent } from './wetting-agent.js';

/** What a new darkroom may begin with. Keys never change; a later document of the same key is a new version. */
export const starterCatalogue: { key: string; document: ChemistryDocument }[] = [
  { key: 'rapid-fixer', document: rapidFixer },
  { key: 'stop-bath-sb5', document: stopBathSb5 },
  { key: 'wetting-agent', document: wettingAgent },
];

export { rapidFixer, stopBathSb5, wettingAgent };
