import { saveText } from '../lib/save-text';

function saveUrl(url: string, fileName: string): void {
  const link = document.createElement('a');
  link.href = url;
  link.download = fileName;
  link.click();
}

/** Styles a drawing takes from the page, written into it so that the file stands alone. */
const CARRIED = [
  'fill',
  'stroke',
  'stroke-width',
  'stroke-dasharray',
  'font-family',
  'font-size',
  'opacity',
];

function standalone(svg: SVGSVGElement): string {
  const copy = svg.cloneNode(true) as SVGSVGElement;
  const originals = svg.querySelectorAll('*');
  copy.querySelectorAll('*').forEach((element, i) => {
    const style = getComputedStyle(originals[i]);
    for (const name of CARRIED) element.setAttribute(name, style.getPropertyValue(name));
  });
  const box = svg.getBoundingClientRect();
  copy.setAttribute('xmlns', 'http://www.w3.org/2000/svg');
  copy.setAttribute('width', String(Math.round(box.width)));
  copy.setAttribute('height', String(Math.round(box.height)));
  return new XMLSerializer().serializeToString(copy);
}

/** Save the drawing inside a frame: a canvas as PNG, a drawing as SVG. */
export async function savePicture(frame: HTMLElement, fileName: string): Promise<void> {
  const canvas = frame.querySelector('canvas');
  if (canvas) {
    const blob = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/png'));
    if (!blob) return;
    const url = URL.createObjectURL(blob);
    saveUrl(url, `${fileName}.png`);
    URL.revokeObjectURL(url);
    return;
  }
  const svg = frame.querySelector('svg');
  if (svg) saveText(`${fileName}.svg`, 'image/svg+xml', standalone(svg));
}
