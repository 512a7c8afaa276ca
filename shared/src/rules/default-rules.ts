import type { Rule } from '../contract/rules.js';
import { AUSTRIA_SWITZERLAND_NETHERLANDS_RULES } from './sheets/austria-switzerland-netherlands.js';
import { FRANCE_RULES } from './sheets/france.js';
import { GENERAL_RULES } from './sheets/general.js';
import { GERMANY_RULES } from './sheets/germany.js';
import { ITALY_RULES } from './sheets/italy.js';
import { JAPAN_KOREA_RULES } from './sheets/japan-korea.js';
import { MASSACHUSETTS_RULES } from './sheets/massachusetts.js';

/**
 * Rule sheets as they ship: editable defaults, none of them law. Each carries its text version,
 * source and how sure we are (A read in the source or a page that quotes it, B from memory of the
 * source, C common practice, D weak). Nobody has confirmed them for a place yet.
 */
export const DEFAULT_RULES: readonly Rule[] = [
  ...GERMANY_RULES,
  ...AUSTRIA_SWITZERLAND_NETHERLANDS_RULES,
  ...FRANCE_RULES,
  ...ITALY_RULES,
  ...JAPAN_KOREA_RULES,
  ...MASSACHUSETTS_RULES,
  ...GENERAL_RULES,
];
