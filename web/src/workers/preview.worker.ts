import { preparePreview, previewLayout, type PreviewPlace } from '@furrowlight/shared/run/preview';
import type { PreviewAnswer, PreviewAsk } from './preview-messages';

let place: PreviewPlace | null = null;

function answer(id: number, ask: Extract<PreviewAsk, { kind: 'question' }>): PreviewAnswer | null {
  if (!place) return null;
  const { layout, canopyHeightM, season } = ask.question;
  const begun = performance.now();
  try {
    const preview = previewLayout(place, layout, canopyHeightM, season);
    return { id, preview, milliseconds: performance.now() - begun };
  } catch (error) {
    return { id, problem: error instanceof Error ? error.message : 'The preview failed.' };
  }
}

self.onmessage = ({ data }: MessageEvent<PreviewAsk>) => {
  if (data.kind === 'place') {
    place = preparePreview(data.site, data.weather);
    return;
  }
  const found = answer(data.id, data);
  if (found) self.postMessage(found);
};
