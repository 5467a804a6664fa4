import type { ContainerKind, Material } from '@wetside/chemistry';
import { showVolume } from '@wetside/chemistry';
import type { ChemistryView, MixContent } from '../../shared/api/types.js';
import { ulFromMl } from '../../shared/formats/amounts.js';
import type { MixSource } from './mix-sources.js';
import { mixingProblem } from './measure-words.js';

export interface MixForm {
  chemistryId: string;
  from: string;
  volumeMl: string;
  sizeMl: string;
  kind: ContainerKind;
  material: Material | '';
  when: 'now' | 'earlier';
  mixedAt: string;
  note: string;
}

/** Why this volume will not do, in words, or true. */
export function checkVolume(
  text: string,
  chemistry: ChemistryView,
  source: MixSource | undefined,
  material: Material | null,
): true | string {
  const ul = ulFromMl(text);
  if (ul === null) return 'A whole number of mL, 1 or more.';
  if (source?.wholeUl && ul !== source.wholeUl)
    return `A powder is mixed whole: this makes ${showVolume(source.wholeUl)}.`;
  if (source?.maxUl && ul > source.maxUl) {
    return `This makes ${showVolume(source.maxUl)}; choose ${showVolume(source.maxUl)} or less.`;
  }
  return mixingProblem(chemistry.document, material, ul) ?? true;
}

export function checkSize(text: string, volumeMl: string): true | string {
  const size = ulFromMl(text);
  const volume = ulFromMl(volumeMl);
  if (size === null) return 'A whole number of mL, 1 or more.';
  return volume !== null && size < volume ? `It must hold ${showVolume(volume)} at least.` : true;
}

/** The material that the bottle will be labelled for: asked only where the chemistry takes several. */
export function materialOf(form: Pick<MixForm, 'material'>, chemistry: ChemistryView): Material | null {
  const taken = chemistry.document.materials.map((use) => use.material);
  const chosen = taken.find((material) => material === form.material);
  return chosen ?? (taken.includes('film') ? 'film' : (taken[0] ?? null));
}

/** What is recorded. Null while the numbers are not whole. */
export function mixContent(
  form: MixForm,
  bottleId: string,
  chemistry: ChemistryView,
  source: MixSource,
): MixContent | null {
  const volumeUl = ulFromMl(form.volumeMl);
  const sizeUl = ulFromMl(form.sizeMl);
  if (volumeUl === null || sizeUl === null) return null;
  return {
    bottleId,
    chemistryVersionId: chemistry.versionId,
    volumeUl,
    container: { sizeUl, kind: form.kind },
    material: materialOf(form, chemistry),
    from: source.from,
    ...(form.note.trim() && { note: form.note.trim() }),
  };
}

const byCode: Record<string, keyof MixForm> = {
  'lot-empty': 'from',
  'opened-too-little': 'volumeMl',
  'more-than-pack-makes': 'volumeMl',
  'whole-only': 'volumeMl',
  'volume-over-container': 'sizeMl',
  'mixed-in-future': 'mixedAt',
  'does-not-make': 'from',
  'stock-too-little': 'volumeMl',
  'stock-closed': 'from',
};
const byField: Record<string, keyof MixForm> = {
  volumeUl: 'volumeMl',
  'container.sizeUl': 'sizeMl',
  'container.kind': 'kind',
  container: 'sizeMl',
  material: 'material',
  happenedAt: 'mixedAt',
  chemistryVersionId: 'chemistryId',
  note: 'note',
};

/** The field of the form that the server's words belong to. */
export function fieldOfMix(field: string, code: string): keyof MixForm | null {
  if (field.startsWith('from')) return 'from';
  return byField[field] ?? byCode[code] ?? null;
}

/** The field, if it stands on the page: the time of a mix made now and the one material of a chemistry are not asked. */
export function shownField(
  field: keyof MixForm | null,
  { when }: MixForm,
  { document }: ChemistryView,
): keyof MixForm | null {
  if (field === 'mixedAt' && when === 'now') return null;
  return field === 'material' && document.materials.length < 2 ? null : field;
}
