import type { DeskItem } from '@furrowlight/shared/contract/desk';
import {
  IconAlertTriangle,
  IconCalendarEvent,
  IconEye,
  IconHourglassLow,
  IconPlant2,
  IconPolygon,
  IconSunHigh,
  type Icon,
} from '@tabler/icons-react';

type Kind = DeskItem['kind'];

export interface DeskGroup {
  title: string;
  kinds: readonly Kind[];
}

/** Most pressing first. */
export const GROUPS: readonly DeskGroup[] = [
  { title: 'Wants an answer', kinds: ['run-failed', 'review-opened', 'review-expiring'] },
  { title: 'Ready to read', kinds: ['run-finished'] },
  { title: 'Coming up', kinds: ['season-starts'] },
  { title: 'Gaps in the records', kinds: ['field-without-boundary', 'field-without-crop'] },
];

export const KINDS: Record<Kind, { icon: Icon; name: string; step: string }> = {
  'run-failed': { icon: IconAlertTriangle, name: 'Run failed', step: 'Open the scenario' },
  'review-opened': { icon: IconEye, name: 'Review opened', step: 'See the review link' },
  'review-expiring': { icon: IconHourglassLow, name: 'Link expires', step: 'See the review link' },
  'run-finished': { icon: IconSunHigh, name: 'Run finished', step: 'Read the result' },
  'season-starts': { icon: IconCalendarEvent, name: 'Season starts', step: 'Open the field' },
  'field-without-boundary': { icon: IconPolygon, name: 'No boundary', step: 'Draw the boundary' },
  'field-without-crop': { icon: IconPlant2, name: 'No crop', step: 'Add a season' },
};

/** Where the next step of an item is done. */
export function placeOf(item: DeskItem): string {
  const field = `/fields/${item.fieldId}`;
  switch (item.kind) {
    case 'run-finished':
      return item.scenarioId ? `${field}/scenarios/${item.scenarioId}/result` : field;
    case 'run-failed':
      return item.scenarioId ? `${field}/scenarios/${item.scenarioId}` : field;
    case 'review-opened':
    case 'review-expiring':
      return `${field}#reviews`;
    case 'field-without-boundary':
      return `${field}?edit=boundary`;
    case 'field-without-crop':
      return `${field}#seasons`;
    case 'season-starts':
      return field;
  }
}
