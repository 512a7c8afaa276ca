import { Layout, type LayoutKind } from '@furrowlight/shared/contract/layout';
import { line } from '@furrowlight/shared/contract/common';
import type { Scenario } from '@furrowlight/shared/contract/scenarios';
import { z } from 'zod';
import { fieldMessages } from '../../lib/field-messages';

/** A shape whose numbers may still be missing while someone types. */
type Loose<T> = T extends number
  ? number | null
  : T extends string | boolean | null
    ? T
    : T extends (infer Item)[]
      ? Loose<Item>[]
      : { [K in keyof T]: Loose<T[K]> };

export type LayoutDraft = Loose<Layout>;
export type ModuleDraft = LayoutDraft['module'];
export type TrackerDraft = NonNullable<LayoutDraft['tracker']>;

/** All a person decides in the row designer. */
export interface Design {
  name: string;
  notes: string;
  weatherId: string | null;
  layout: LayoutDraft;
}

const Named = z.object({ name: line('Scenario name'), layout: Layout });

/** What is wrong with a design, in the contract's own words, by dotted path. */
export const designMessages = (design: Design): Record<string, string> =>
  fieldMessages(Named, { name: design.name, layout: design.layout });

/** The rows if they can stand; null while something is missing or collides. */
export const soundLayout = (draft: LayoutDraft): Layout | null =>
  Layout.safeParse(draft).data ?? null;

export const designOf = ({ name, notes, weatherId, layout }: Scenario): Design => ({
  name,
  notes,
  weatherId,
  layout,
});

export const isSameDesign = (a: Design, b: Design): boolean =>
  JSON.stringify(a) === JSON.stringify(b);

/** Where rows of a kind look, for a field of that latitude. */
export function usualAzimuth(kind: LayoutKind, latitude: number): number {
  if (kind === 'vertical-bifacial' || kind === 'single-axis-tracker') return 90;
  return latitude >= 0 ? 180 : 0;
}

/** Facing that lays rows along a bearing, out of the two the one nearer to the usual. */
export function azimuthAlong(bearingDeg: number, usualDeg: number): number {
  const sides = [(bearingDeg + 90) % 360, (bearingDeg + 270) % 360];
  const apart = (angle: number) => Math.abs(((angle - usualDeg + 540) % 360) - 180);
  return Math.round(apart(sides[0]) <= apart(sides[1]) ? sides[0] : sides[1]);
}
