import { defineTokens } from '@chakra-ui/react';

/** Raw values. Features never name these: they name the semantic tokens. */
export const tokens = defineTokens({
  colors: {
    enamel: {
      ground: { value: '#F3F1EA' },
      well: { value: '#ECE8DC' },
      white: { value: '#FFFFFF' },
      line: { value: '#D9D4C6' },
      rule: { value: '#B9B2A0' },
      field: { value: '#857F70' },
      glass: { value: '#7D7767' },
    },
    ink: { 900: { value: '#23211C' }, 600: { value: '#6A6457' } },
    amber: { 800: { value: '#7B3F0E' }, 900: { value: '#653209' } },
    cream: { fill: { value: '#F1E3B8' }, text: { value: '#3B3220' }, edge: { value: '#8F7E45' } },
    signal: { watch: { value: '#965900' }, stop: { value: '#8C1A14' } },
  },
  fonts: {
    body: { value: "'Source Sans 3', sans-serif" },
    heading: { value: "'Source Sans 3', sans-serif" },
  },
  fontSizes: {
    small: { value: '14px' },
    text: { value: '16px' },
    lead: { value: '20px' },
    figure: { value: '27px' },
    title: { value: '34px' },
    display: { value: '40px' },
  },
  /** Steps that the usual scale of fours leaves out: 52 px for a main action, 60 and 76 for the sink. */
  sizes: { 13: { value: '52px' }, 15: { value: '60px' }, 19: { value: '76px' } },
  radii: {
    tape: { value: '3px' },
    control: { value: '7px' },
    sheet: { value: '10px' },
    tray: { value: '16px' },
  },
});
