import type { Layout } from '@furrowlight/shared/contract/layout';
import { compassPoint } from '../../lib/format';

/** Which way lies up and down in the weave: the front side is at the top. */
export function sidesOf(layout: Layout): { front: string; back: string } {
  return {
    front: `${compassPoint(layout.azimuthDeg)} side`,
    back: `${compassPoint(layout.azimuthDeg + 180)} side`,
  };
}
