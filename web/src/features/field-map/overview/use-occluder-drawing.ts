import type { LonLat } from '@furrowlight/shared/contract/fields';
import { useMemo, useState } from 'react';

export interface OccluderDrawing {
  /** Points tapped so far; null while nothing is being drawn. */
  line: LonLat[] | null;
  start: () => void;
  stop: () => void;
  add: (at: LonLat) => void;
  undo: () => void;
}

/** The line of a hedge, wood or building while it is tapped on the map. */
export function useOccluderDrawing(): OccluderDrawing {
  const [line, setLine] = useState<LonLat[] | null>(null);
  return useMemo(
    () => ({
      line,
      start: () => setLine([]),
      stop: () => setLine(null),
      add: (at) => setLine((before) => before && [...before, at]),
      undo: () => setLine((before) => before && before.slice(0, -1)),
    }),
    [line],
  );
}
