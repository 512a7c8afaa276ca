/** The inks and papers of both themes. Every text/ground pair is checked for WCAG AA in a test. */
export interface Palette {
  /** Page ground. */
  paper: string;
  /** Raised sheet: cards, inputs, dialogs. */
  sheet: string;
  /** Sunk ground: rails, table heads, wells. */
  sunk: string;
  ink: string;
  inkSoft: string;
  /** Hairlines that carry no meaning. */
  line: string;
  /** Edges of controls, at least 3:1 on paper and sheet. */
  edge: string;
  leaf: string;
  soil: string;
  dusk: string;
  /** The one bright thing: light itself. Never used for text. */
  straw: string;
  haze: string;
  danger: string;
  warn: string;
  /** Text on a leaf-coloured ground. */
  onLeaf: string;
}

export const light: Palette = {
  paper: '#FBF8F1',
  sheet: '#FFFDF9',
  sunk: '#F3EEE1',
  ink: '#1F2A2E',
  inkSoft: '#4E5A5D',
  line: '#E0D9C9',
  edge: '#8A8375',
  leaf: '#346941',
  soil: '#6B4F3A',
  dusk: '#2F3E66',
  straw: '#E3B04B',
  haze: '#DDE8EE',
  danger: '#A3402E',
  warn: '#7A4F0C',
  onLeaf: '#FFFFFF',
};

export const dark: Palette = {
  paper: '#12191C',
  sheet: '#1A2326',
  sunk: '#0D1315',
  ink: '#EDE8DC',
  inkSoft: '#A9B2AF',
  line: '#2E3A3E',
  edge: '#738184',
  leaf: '#7FBF8E',
  soil: '#C9A88C',
  dusk: '#A9B8E0',
  straw: '#F0C766',
  haze: '#22323B',
  danger: '#EB9480',
  warn: '#E9BF6A',
  onLeaf: '#12191C',
};
