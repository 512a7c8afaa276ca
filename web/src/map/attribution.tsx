import { useMemo } from 'react';

interface Part {
  text: string;
  href: string | null;
}

/** Text and links of a map credit; every other mark-up is dropped. */
function parts(html: string): Part[] {
  const body = new DOMParser().parseFromString(html, 'text/html').body;
  return [...body.childNodes].map((node) => {
    const href = node instanceof HTMLAnchorElement ? node.getAttribute('href') : null;
    return { text: node.textContent ?? '', href: href && /^https?:/.test(href) ? href : null };
  });
}

/** Credit of a background map, as its operator writes it, with its links. */
export function Attribution({ html }: { html: string }) {
  const shown = useMemo(() => parts(html), [html]);
  return (
    <span>
      {shown.map(({ text, href }, i) =>
        href ? (
          <a key={i} href={href} target="_blank" rel="noreferrer">
            {text}
          </a>
        ) : (
          <span key={i}>{text}</span>
        ),
      )}
    </span>
  );
}
