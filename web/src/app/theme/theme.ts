import {
  createTheme,
  localStorageColorSchemeManager,
  type CSSVariablesResolver,
  type MantineColorsTuple,
} from '@mantine/core';
import { components } from './components';
import { dark, light, type Palette } from './palette';
import { rampVariables } from './ramp';

const leaf: MantineColorsTuple = [
  '#EEF5EF',
  '#DCEADF',
  '#B9D5C0',
  '#9ACBA6',
  '#7FBF8E',
  '#5A9E6B',
  '#3F7D4E',
  '#346941',
  '#2A5535',
  '#1F4028',
];
const soil: MantineColorsTuple = [
  '#F7F1EB',
  '#EADDD0',
  '#DAC4AF',
  '#C9A88C',
  '#B48D6D',
  '#977052',
  '#7E5F47',
  '#6B4F3A',
  '#543D2C',
  '#3D2C1F',
];
const dusk: MantineColorsTuple = [
  '#EEF1F9',
  '#D9DFF0',
  '#C0CAE8',
  '#A9B8E0',
  '#8494C4',
  '#6072A6',
  '#44558A',
  '#2F3E66',
  '#243052',
  '#1A233D',
];
const straw: MantineColorsTuple = [
  '#FDF6E3',
  '#FBEBC4',
  '#F8DD9B',
  '#F0C766',
  '#E3B04B',
  '#D9A441',
  '#B9852A',
  '#94681B',
  '#7A4F0C',
  '#563707',
];
const danger: MantineColorsTuple = [
  '#FBEFEB',
  '#F5DAD2',
  '#EFB8A9',
  '#EB9480',
  '#D87059',
  '#C05540',
  '#B0493A',
  '#A3402E',
  '#823225',
  '#5E2319',
];
const ink: MantineColorsTuple = [
  '#EDE8DC',
  '#D5D5CD',
  '#A9B2AF',
  '#738184',
  '#4E5A5D',
  '#2E3A3E',
  '#22323B',
  '#1F2A2E',
  '#12191C',
  '#0D1315',
];

export const schemeManager = localStorageColorSchemeManager({ key: 'furrowlight-scheme' });

export const theme = createTheme({
  components,
  colors: { leaf, soil, dusk, straw, danger, ink, red: danger, dark: ink },
  primaryColor: 'leaf',
  primaryShade: { light: 7, dark: 4 },
  autoContrast: true,
  luminanceThreshold: 0.32,
  black: light.ink,
  white: light.sheet,
  fontFamily: "'Work Sans', system-ui, sans-serif",
  fontFamilyMonospace: 'ui-monospace, SFMono-Regular, Menlo, monospace',
  headings: {
    fontFamily: "'Work Sans', system-ui, sans-serif",
    fontWeight: '600',
    sizes: {
      h1: { fontSize: '2rem', lineHeight: '1.15' },
      h2: { fontSize: '1.3125rem', lineHeight: '1.25' },
      h3: { fontSize: '1.0625rem', lineHeight: '1.35' },
      h4: { fontSize: '0.9375rem', lineHeight: '1.4' },
    },
  },
  fontSizes: {
    xs: '0.78125rem',
    sm: '0.875rem',
    md: '0.9375rem',
    lg: '1.0625rem',
    xl: '1.3125rem',
  },
  radius: { xs: '2px', sm: '3px', md: '4px', lg: '6px', xl: '10px' },
  defaultRadius: 'sm',
  shadows: {
    xs: 'none',
    sm: '0 1px 0 var(--fl-line)',
    md: '0 6px 24px -12px rgb(31 42 46 / 0.35)',
    lg: '0 12px 40px -16px rgb(31 42 46 / 0.4)',
    xl: '0 20px 60px -20px rgb(31 42 46 / 0.45)',
  },
  cursorType: 'pointer',
  respectReducedMotion: true,
});

function paletteVariables(palette: Palette): Record<string, string> {
  return {
    '--fl-paper': palette.paper,
    '--fl-sheet': palette.sheet,
    '--fl-sunk': palette.sunk,
    '--fl-ink': palette.ink,
    '--fl-ink-soft': palette.inkSoft,
    '--fl-line': palette.line,
    '--fl-edge': palette.edge,
    '--fl-leaf': palette.leaf,
    '--fl-soil': palette.soil,
    '--fl-dusk': palette.dusk,
    '--fl-straw': palette.straw,
    '--fl-haze': palette.haze,
    '--fl-danger': palette.danger,
    '--fl-warn': palette.warn,
    '--fl-on-leaf': palette.onLeaf,
    '--mantine-color-body': palette.paper,
    '--mantine-color-text': palette.ink,
    '--mantine-color-bright': palette.ink,
    '--mantine-color-dimmed': palette.inkSoft,
    '--mantine-color-anchor': palette.dusk,
    '--mantine-color-error': palette.danger,
    '--mantine-color-placeholder': palette.inkSoft,
    '--mantine-color-default': palette.sheet,
    '--mantine-color-default-hover': palette.sunk,
    '--mantine-color-default-color': palette.ink,
    '--mantine-color-default-border': palette.edge,
    '--mantine-color-disabled': palette.sunk,
    '--mantine-color-disabled-color': palette.inkSoft,
    '--mantine-color-disabled-border': palette.line,
  };
}

/** Both palettes and the light ramp as CSS custom properties; Mantine's own follow them. */
export const variables: CSSVariablesResolver = () => ({
  variables: rampVariables(),
  light: paletteVariables(light),
  dark: paletteVariables(dark),
});
