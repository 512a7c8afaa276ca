import type { Layout } from '@furrowlight/shared/contract/layout';
import type { Site } from '@furrowlight/shared/contract/run';
import type { HourlyYear } from '@furrowlight/shared/light/weather-year';
import type { Preview } from '@furrowlight/shared/run/preview';

/** What a preview looks at: rows, canopy height and the crop's days. */
export interface PreviewQuestion {
  layout: Layout;
  canopyHeightM: number;
  /** 0-based first day and length, may run over New Year. */
  season: { firstDay: number; days: number };
}

/** Messages to the worker: the field and weather once, then one question after another. */
export type PreviewAsk =
  | { kind: 'place'; site: Site; weather: HourlyYear }
  | { kind: 'question'; id: number; question: PreviewQuestion };

export type PreviewAnswer =
  { id: number; preview: Preview; milliseconds: number } | { id: number; problem: string };
