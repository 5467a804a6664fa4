import { createSystem, defaultBaseConfig, defineConfig, mergeConfigs } from '@chakra-ui/react';
import {
  animationStyles,
  breakpoints,
  buttonRecipe,
  dialogSlotRecipe,
  fieldSlotRecipe,
  globalCss,
  inputRecipe,
  keyframes,
  layerStyles,
  nativeSelectSlotRecipe,
  semanticTokens as chakraSemanticTokens,
  textareaRecipe,
  textStyles,
  tokens as chakraTokens,
} from '@chakra-ui/react/theme';
import { semanticTokens } from './semantic-tokens.js';
import { tokens } from './tokens.js';

/** Only the recipes in use: a component whose recipe is missing here renders unstyled, without an error. */
const base = defineConfig({
  preflight: true,
  cssVarsPrefix: 'chakra',
  cssVarsRoot: ':where(html, .chakra-theme)',
  globalCss,
  theme: {
    animationStyles,
    breakpoints,
    keyframes,
    layerStyles,
    semanticTokens: chakraSemanticTokens,
    textStyles,
    tokens: chakraTokens,
    recipes: { button: buttonRecipe, input: inputRecipe, textarea: textareaRecipe },
    slotRecipes: { dialog: dialogSlotRecipe, field: fieldSlotRecipe, nativeSelect: nativeSelectSlotRecipe },
  },
});

const own = defineConfig({
  globalCss: {
    html: { colorPalette: 'brand', bg: 'bg', color: 'ink', fontVariantNumeric: 'tabular-nums lining-nums' },
    body: { bg: 'bg', color: 'ink', fontSize: 'text' },
    // On every element, for the reset sets it on every element: long names wrap, and never widen the page.
    '*': { overflowWrap: 'anywhere' },
    '*:focus-visible': { outline: '3px solid {colors.focus}', outlineOffset: '2px' },
  },
  theme: {
    tokens,
    semanticTokens,
    recipes: {
      button: { base: { borderRadius: 'control' }, variants: { size: { md: { textStyle: 'md' } } } },
      input: { base: { borderRadius: 'control' }, variants: { size: { md: { textStyle: 'md' } } } },
      textarea: { base: { borderRadius: 'control' }, variants: { size: { md: { textStyle: 'md' } } } },
    },
    slotRecipes: {
      nativeSelect: {
        slots: ['root', 'field', 'indicator'],
        base: { field: { borderRadius: 'control' } },
        variants: { size: { md: { field: { textStyle: 'md' } } } },
      },
    },
  },
});

export const system = createSystem(mergeConfigs(defaultBaseConfig, base, own));
