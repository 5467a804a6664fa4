import { defineSemanticTokens } from '@chakra-ui/react';

const to = (name: string) => ({ value: `{colors.${name}}` });

/** The names that features use, and the names that Chakra's own recipes ask for, led back to them. */
export const semanticTokens = defineSemanticTokens({
  colors: {
    bg: {
      DEFAULT: to('enamel.ground'),
      well: to('enamel.well'),
      subtle: to('enamel.well'),
      muted: to('enamel.well'),
      emphasized: to('enamel.line'),
      panel: to('enamel.white'),
    },
    surface: to('enamel.white'),
    ink: { DEFAULT: to('ink.900'), muted: to('ink.600') },
    fg: { DEFAULT: to('ink.900'), muted: to('ink.600'), subtle: to('ink.600'), error: to('signal.stop') },
    line: to('enamel.line'),
    rule: to('enamel.rule'),
    field: to('enamel.field'),
    glass: to('enamel.glass'),
    border: {
      DEFAULT: to('enamel.field'),
      muted: to('enamel.line'),
      subtle: to('enamel.line'),
      emphasized: to('enamel.field'),
      error: to('signal.stop'),
    },
    brand: {
      DEFAULT: to('amber.800'),
      ink: to('enamel.white'),
      solid: to('amber.800'),
      contrast: to('enamel.white'),
      fg: to('ink.900'),
      muted: to('enamel.line'),
      subtle: to('enamel.well'),
      emphasized: to('enamel.rule'),
      border: to('enamel.field'),
      focusRing: to('ink.900'),
    },
    tape: { DEFAULT: to('cream.fill'), ink: to('cream.text'), edge: to('cream.edge') },
    state: { watch: to('signal.watch'), stop: to('signal.stop') },
    focus: to('ink.900'),
  },
});
