import type { Site } from '@furrowlight/shared/contract/run';
import type { HourlyYear } from '@furrowlight/shared/light/weather-year';
import type { Preview } from '@furrowlight/shared/run/preview';
import { useEffect, useRef, useState } from 'react';
import type { PreviewAnswer, PreviewAsk, PreviewQuestion } from './preview-messages';

interface Courier {
  worker: Worker;
  /** A question is being worked on. */
  busy: boolean;
  /** The newest question that still waits; older ones are forgotten. */
  waiting: PreviewQuestion | null;
  lastId: number;
}

export interface LivePreview {
  preview: Preview | null;
  /** Why there is none for the present rows. */
  problem: string | null;
  /** Time the worker took, ms. */
  milliseconds: number | null;
}

const NOTHING: LivePreview = { preview: null, problem: null, milliseconds: null };

function pass(courier: Courier): void {
  if (courier.busy || !courier.waiting) return;
  courier.busy = true;
  courier.lastId += 1;
  const ask: PreviewAsk = { kind: 'question', id: courier.lastId, question: courier.waiting };
  courier.waiting = null;
  courier.worker.postMessage(ask);
}

/**
 * Season light of a layout, worked out beside the page. While one question is worked on only the
 * newest of the following waits, so a moving slider never builds a queue.
 *
 * @param weather null while there is no weather year
 * @param question must keep its identity while nothing changed
 */
export function usePreview(
  site: Site,
  weather: HourlyYear | null,
  question: PreviewQuestion,
): LivePreview {
  const [live, setLive] = useState(NOTHING);
  const courier = useRef<Courier | null>(null);
  const newest = useRef(question);

  useEffect(() => {
    if (!weather) return undefined;
    const worker = new Worker(new URL('./preview.worker.ts', import.meta.url), { type: 'module' });
    const made: Courier = { worker, busy: false, waiting: newest.current, lastId: 0 };
    courier.current = made;
    worker.onmessage = ({ data }: MessageEvent<PreviewAnswer>) => {
      made.busy = false;
      setLive(
        'problem' in data
          ? { ...NOTHING, problem: data.problem }
          : { preview: data.preview, problem: null, milliseconds: data.milliseconds },
      );
      pass(made);
    };
    const place: PreviewAsk = { kind: 'place', site, weather };
    worker.postMessage(place);
    pass(made);
    return () => {
      courier.current = null;
      worker.terminate();
      setLive(NOTHING);
    };
  }, [site, weather]);

  useEffect(() => {
    newest.current = question;
    const { current } = courier;
    if (!current) return;
    current.waiting = question;
    pass(current);
  }, [question]);

  return live;
}
