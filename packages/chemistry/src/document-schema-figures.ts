import { listOf, object, ref, type Schema } from './schema.js';

const text: Schema = { type: 'string', minLength: 1 };
const whole: Schema = { type: 'integer', minimum: 0 };
const above: Schema = { type: 'integer', minimum: 1 };
const degrees: Schema = { type: 'integer' };
const kind = (name: string): Schema => ({ const: name });

/** A figure: its own fields, and the key of its source. */
const sourced = (required: Record<string, Schema>, optional: Record<string, Schema> = {}): Schema =>
  object({ ...required, source: text }, { ...optional, sheetInHand: { type: 'boolean' }, note: text });

const containers = { enum: ['full', 'part-full', 'floating-lid', 'open-tray'] };
const containerFit = object(
  {},
  {
    minSizeUl: whole,
    maxSizeUl: whole,
    materials: listOf({ enum: ['glass', 'pet', 'soft-polyethylene', 'concertina'] }),
  },
);

const dilution: Schema = {
  oneOf: [
    object({ kind: kind('ready-to-use') }),
    object({
      kind: kind('plus'),
      parts: { ...listOf(object({ name: text, parts: above })), minItems: 1 },
      water: whole,
    }),
    object({ kind: kind('percent'), name: text, haveE4: above, wantE4: above }),
    object({ kind: kind('packet'), name: text, makesUl: above }, { startWaterUl: whole, waterCc: degrees }),
    object(
      {
        kind: kind('weighed'),
        parts: {
          ...listOf({
            oneOf: [object({ name: text, mgPerLitre: above }), object({ name: text, ulPerLitre: above })],
          }),
          minItems: 1,
        },
        startWaterUlPerLitre: whole,
      },
      { waterCc: degrees },
    ),
  ],
};

const test = (material: Schema): Schema => ({
  oneOf: [
    sourced({ kind: kind('clip'), spentAtFactorE4: above, toleranceCc: whole }),
    sourced({ kind: kind('silver'), limitMgPerL: above }, { material }),
    sourced({ kind: kind('indicator'), fresh: text, turning: text, spent: text }),
    sourced({ kind: kind('ph') }, { spentAboveE2: whole, spentBelowE2: whole }),
    sourced({ kind: kind('control-strip'), what: text }),
    sourced({ kind: kind('control-clip'), what: text }),
    sourced({ kind: kind('iodide'), method: text }),
  ],
});

const useRule: Schema = {
  oneOf: [
    sourced({
      kind: kind('percent-per-rolls'),
      growthE4: whole,
      everyRollsE4: above,
      perLitre: { const: true },
    }),
    sourced({
      kind: kind('table'),
      steps: { ...listOf(object({ fromRollsE4: whole, factorE4: above })), minItems: 1 },
    }),
  ],
};

const timeRow = (material: Schema): Schema =>
  sourced(
    { temperatureCc: degrees, seconds: above },
    {
      film: text,
      exposureIndex: above,
      material,
      dilution: text,
      agitation: { enum: ['hand', 'rotary', 'rack', 'tray', 'stand'] },
      toleranceCc: whole,
      toSeconds: above,
      bound: { enum: ['at-least', 'exact'] },
    },
  );

/** The parts of a document that hold figures, by name. */
export function figureDefs(names: { materials: string[]; filmClasses: string[] }): Record<string, Schema> {
  const material: Schema = { enum: names.materials };
  return {
    source: object({
      kind: { enum: ['published', 'second-hand', 'common-practice', 'memory', 'darkroom'] },
      text,
    }),
    sourced: sourced({}),
    dilution,
    capacity: {
      oneOf: [
        sourced({ per: kind('litre'), rollsE4: whole }),
        sourced({ per: kind('bottle'), rollsE4: whole }, { bottleUl: above }),
      ],
    },
    materialUse: object({ material, capacity: listOf(ref('capacity')) }, { dilution: ref('dilution') }),
    filmFactor: sourced({ filmClass: { enum: names.filmClasses }, factorE4: above }),
    useRule,
    timeRow: timeRow(material),
    step: sourced({ name: text, seconds: above, temperatureCc: degrees, toleranceCc: whole }),
    duration: object({ count: whole, unit: { enum: ['months', 'weeks', 'days'] } }),
    keeping: sourced(
      { state: containers, keeps: ref('duration'), from: { enum: ['mixing', 'first-use'] } },
      { container: containerFit },
    ),
    concentrateKeeping: sourced({ opened: { type: 'boolean' }, keeps: ref('duration') }),
    test: test(material),
    part: object({
      name: text,
      form: { enum: ['powder-packet', 'liquid', 'single-chemical', 'ready-to-use'] },
      divisible: { type: 'boolean' },
    }),
    readyAfter: sourced({ seconds: above, why: text }),
    replenishment: sourced({ ulPerRoll: above }, { needsStarter: { type: 'boolean' } }),
    oneShot: sourced({ leastStockPerRollUl: whole }, { workingDilution: ref('dilution') }),
  };
}
