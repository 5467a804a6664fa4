import { figureDefs } from './document-schema-figures.js';
import { filmClasses, materials } from './film.js';
import { processes, roles, wasteRoutes, waysOfUse } from './role.js';
import { listOf, object, ref, type Schema } from './schema.js';

const text: Schema = { type: 'string', minLength: 1 };

/**
 * A chemistry document, schema 1, as JSON Schema 2020-12. Optional fields may be added under the same number.
 * What a schema cannot say (that each source key exists) parseChemistryDocument checks besides.
 */
export const chemistryDocumentSchema: Schema & { $schema: string } = {
  $schema: 'https://json-schema.org/draft/2020-12/schema',
  title: 'Chemistry document',
  ...object(
    {
      schema: { const: 1 },
      name: text,
      role: { enum: [...roles] },
      processes: { ...listOf({ enum: [...processes] }), minItems: 1 },
      use: { enum: [...waysOfUse] },
      dilution: ref('dilution'),
      dilutionSources: listOf(ref('sourced')),
      water: { enum: ['tap', 'distilled'] },
      materials: listOf(ref('materialUse')),
      filmFactors: listOf(ref('filmFactor')),
      timeRows: listOf(ref('timeRow')),
      keeping: listOf(ref('keeping')),
      concentrateKeeping: listOf(ref('concentrateKeeping')),
      tests: listOf(ref('test')),
      parts: listOf(ref('part')),
      cheapToRenew: { type: 'boolean' },
      cautions: listOf(text),
      hazardNote: text,
      waste: object({ route: { enum: [...wasteRoutes] }, note: text }),
      sources: { type: 'object', additionalProperties: ref('source') },
    },
    {
      useRule: ref('useRule'),
      steps: listOf(ref('step')),
      keepingNote: text,
      endsAtOnce: listOf(text),
      readyAfter: ref('readyAfter'),
      replenishment: ref('replenishment'),
      oneShot: ref('oneShot'),
    },
  ),
  $defs: figureDefs({ materials: [...materials], filmClasses: [...filmClasses] }),
};
